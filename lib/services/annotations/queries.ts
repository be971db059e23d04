import "server-only";
import { and, asc, eq } from "drizzle-orm";
import { annotations } from "@/db/schema";
import type { Ctx } from "@/db/transaction";
import { authorize, requireAction } from "@/lib/policy";

export type Annotation = typeof annotations.$inferSelect;

interface Read {
  ctx: Ctx;
  input: { wardId: string; indicatorId: string };
}

/** The notes on one chart, by month and then in the order written. */
export async function listAnnotations({ ctx, input }: Read): Promise<Annotation[]> {
  requireAction(ctx.actor, "chart.read");
  authorize(ctx.actor, "chart.read", { wardId: input.wardId });
  return ctx.db
    .select()
    .from(annotations)
    .where(and(eq(annotations.wardId, input.wardId), eq(annotations.indicatorId, input.indicatorId)))
    .orderBy(asc(annotations.month), asc(annotations.createdAt), asc(annotations.id));
}
