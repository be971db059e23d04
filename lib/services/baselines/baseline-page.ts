import "server-only";
import type { Ctx } from "@/db/transaction";
import { can, requireAction } from "@/lib/policy";
import type { BaselineReply } from "@/lib/schemas/baseline";
import { baselineReply, loadBaselines, loadFacts } from "./internal";
import { openSeries, type OpenSeries } from "./open-series";

export interface BaselineItem extends BaselineReply {
  /** This person may decide it: it waits, and somebody else proposed it. */
  canDecide: boolean;
}

export interface BaselinePage {
  series: OpenSeries;
  items: BaselineItem[];
  /** What this person's form does: set alone, propose, or nothing. */
  mode: "set" | "propose" | null;
}

export async function getBaselinePage({
  ctx,
  input,
}: {
  ctx: Ctx;
  input: { ward: string; indicator: string };
}): Promise<BaselinePage> {
  requireAction(ctx.actor, "baseline.read");
  const series = await openSeries(ctx, "baseline.read", input);
  const { ward, indicator, key } = series;
  const facts = await loadFacts(ctx, key);
  const rows = await loadBaselines(ctx, key);
  const wasSet = rows.some((row) => row.state === "decided" || row.state === "superseded");
  const mayPropose = can(ctx.actor, "baseline.propose", { wardId: ward.id, team: indicator.team });
  const maySet = !wasSet && can(ctx.actor, "baseline.set", { wardId: ward.id });
  return {
    series,
    items: rows.map((row) => ({
      ...baselineReply(row, series, facts),
      canDecide:
        row.state === "proposed" &&
        can(ctx.actor, "baseline.decide", { wardId: ward.id, authorId: row.proposedById }),
    })),
    mode: maySet ? "set" : mayPropose ? "propose" : null,
  };
}
