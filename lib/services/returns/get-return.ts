import "server-only";
import type { Ctx } from "@/db/transaction";
import type { Month } from "@/lib/indicators/month";
import { authorize, requireAction } from "@/lib/policy";
import type { WardReturnReply } from "@/lib/schemas/ward-return";
import { readReturn, wardWithReturn } from "@/lib/services/tallies";
import { currentReply } from "./reply";

interface Read {
  ctx: Ctx;
  input: { ward: string; month: Month };
}

/** A ward's return of a month that has begun; opened by the first look at it. */
export async function getReturn({ ctx, input }: Read): Promise<WardReturnReply> {
  requireAction(ctx.actor, "return.read");
  const { ward, day } = await wardWithReturn(ctx, input);
  authorize(ctx.actor, "return.read", { wardId: ward.id });
  return currentReply(ctx, await readReturn(ctx, ward, input.month, day), ward, day);
}
