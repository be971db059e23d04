import type { Actor } from "@/lib/policy";
import { setBaselineSchema, type BaselineReply } from "@/lib/schemas/baseline";
import { decideBaseline, setBaseline } from "@/lib/services/baselines";
import type { Counts } from "./series";
import { TEST_NOW, type TestStore } from "./store";

/** The ward and indicator that `newSeries` makes of a code. */
export const codes = (code: string) => ({ ward: code, indicator: `${code}-I` });

/** About half of what came before. */
export const lowerCounts: Counts = Array.from({ length: 10 }, (_, index) => [index % 2 === 0 ? 4 : 6, 100]);

/** Sets or proposes a baseline, the body parsed as the route does. */
export async function put(
  store: TestStore,
  code: string,
  body: object,
  actor: Actor = store.lead,
  at: Date = TEST_NOW,
): Promise<BaselineReply> {
  const input = { ...setBaselineSchema.parse({ reason: "Steady months", ...body }), ...codes(code) };
  return setBaseline({ ctx: store.ctxFor(actor, at), input });
}

/** Decides a proposal, by a second lead unless somebody else is named. */
export async function decide(
  store: TestStore,
  code: string,
  proposal: BaselineReply,
  over: { agree?: boolean; version?: number; reason?: string | null; actor?: Actor; at?: Date } = {},
): Promise<BaselineReply> {
  const {
    agree = true,
    version = proposal.version,
    reason = null,
    actor = store.secondLead,
    at = TEST_NOW,
  } = over;
  return decideBaseline({
    ctx: store.ctxFor(actor, at),
    input: { ...codes(code), id: proposal.id, agree, version, reason },
  });
}
