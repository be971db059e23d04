import "server-only";
import { sql } from "drizzle-orm";

/**
 * SQL over a tally `t`, its indicator `i` and the shared denominator's value `d`: the figures that hold, whichever
 * row they stand in. The same reading as `answerOf` in lib/indicators; a test keeps the two together.
 */
export const joinDenominator = sql`left join denominator_values d
  on d.ward_id = t.ward_id and d.month = t.month and d.shared_denominator_id = i.shared_denominator_id`;

export const effectiveDenominator = sql`coalesce(t.denominator, d.value)`;

export const effectiveAwaited = sql`(case when ${effectiveDenominator} is null then coalesce(t.awaited, d.awaited) end)`;

/** True for a count, nothing to count, not collected and awaited; false for a blank or a draft, never null. */
export const isAnswered = sql`(
  t.not_collected is not null
  or ${effectiveAwaited} is not null
  or coalesce(${effectiveDenominator} = 0 and coalesce(t.numerator, 0) = 0, false)
  or (t.numerator is not null and coalesce(${effectiveDenominator} > 0, false))
)`;
