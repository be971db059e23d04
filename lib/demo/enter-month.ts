import { acceptReturn, submitReturn } from "@/lib/services/returns";
import { saveTally } from "@/lib/services/tallies";
import { demoIndicators, demoWards, reports, type DemoIndicator, type DemoWard } from "./hospital";
import type { Cast } from "./people";
import { talliesOf, type DemoTally } from "./figures";
import type { Stage } from "./stage";
import { story } from "./story";

/** A month as the wards entered it: infection control its lines first, then each ward, then the lead accepts. */
export async function enterMonth(stage: Stage, cast: Cast, back: number): Promise<void> {
  const month = stage.month(back);
  const tallies = talliesOf({ month, back });
  for (const [index, ward] of demoWards.entries()) {
    const own = tallies.filter((tally) => tally.ward === ward.code);
    if (back === 0 && ward.code === story.notBegun) continue;
    await enterTeamLines(stage, cast, ward, own, back);
    const isBegun = back === 0 && ward.code === story.begun;
    await enterWardLines(stage, cast, ward, isBegun ? own.slice(0, 3) : own, back);
    if (isBegun) continue;

    const day = 2 + (index % 4);
    const input = { ward: ward.code, month };
    await submitReturn({ ctx: stage.ctx(cast.nurseOf(ward.code), stage.after(back, day, 15)), input });
    // Of the last month two returns wait for the lead.
    if (back === 0 && index >= demoWards.length - 2) continue;
    await acceptReturn({ ctx: stage.ctx(cast.lead, stage.after(back, 7, 10)), input });
  }
}

/** Lines that infection control counts, on all wards alike. */
export async function enterTeamLines(
  stage: Stage,
  cast: Cast,
  ward: DemoWard,
  own: readonly DemoTally[],
  back: number,
) {
  const ctx = stage.ctx(cast.infection, stage.after(back, 2, 8));
  for (const indicator of linesOf(ward).filter((each) => each.numeratorBy === "team")) {
    const tally = own.find((each) => each.indicator === indicator.code);
    if (tally) await saveTally({ ctx, input: { ...keyOf(tally), numerator: tally.numerator, version: 0 } });
  }
}

async function enterWardLines(
  stage: Stage,
  cast: Cast,
  ward: DemoWard,
  own: readonly DemoTally[],
  back: number,
) {
  const ctx = stage.ctx(cast.nurseOf(ward.code), stage.after(back, 2, 14));
  const typedOnce = new Set<string>();
  for (const indicator of linesOf(ward)) {
    const tally = own.find((each) => each.indicator === indicator.code);
    if (!tally) continue;
    const shared = indicator.sharedDenominator;
    const isTyped = shared !== undefined && typedOnce.has(shared);
    if (shared) typedOnce.add(shared);
    const byWard = indicator.numeratorBy !== "team";
    const input = {
      ...keyOf(tally),
      ...(byWard ? { numerator: tally.numerator } : {}),
      ...(isTyped ? {} : denominatorOf(tally, back)),
      ...(shared === undefined || isTyped ? {} : { denominatorVersion: 0 }),
      version: byWard ? 0 : 1,
    };
    if (byWard || !isTyped) await saveTally({ ctx, input });
  }
}

/** In the last month Tern's doses are still to come from pharmacy. */
function denominatorOf(tally: DemoTally, back: number) {
  const isAwaited = back === 0 && tally.ward === "TERN" && tally.indicator === "DOSES";
  return isAwaited ? { awaited: "pharmacy" } : { denominator: tally.denominator };
}

function linesOf(ward: DemoWard): DemoIndicator[] {
  return demoIndicators.filter((indicator) => reports(indicator, ward));
}

const keyOf = ({ ward, indicator, month }: DemoTally) => ({ ward, indicator, month });
