import "server-only";
import type { Ctx } from "@/db/transaction";
import { requireAction } from "@/lib/policy";
import type { BaselineReply } from "@/lib/schemas/baseline";
import { baselineReply, loadBaselines, loadFacts } from "./internal";
import { openSeries } from "./open-series";

interface Read {
  ctx: Ctx;
  input: { ward: string; indicator: string };
}

/** Every baseline that a chart had or was proposed, newest first: few enough for one page. */
export async function listBaselines({
  ctx,
  input,
}: Read): Promise<{ items: BaselineReply[]; nextCursor: null }> {
  requireAction(ctx.actor, "baseline.read");
  const series = await openSeries(ctx, "baseline.read", input);
  const facts = await loadFacts(ctx, series.key);
  const rows = await loadBaselines(ctx, series.key);
  return { items: rows.map((row) => baselineReply(row, series, facts)), nextCursor: null };
}
