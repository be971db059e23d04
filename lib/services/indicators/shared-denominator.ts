import "server-only";
import { eq } from "drizzle-orm";
import { uuidv7 } from "uuidv7";
import { sharedDenominators } from "@/db/schema";
import type { TxCtx } from "@/db/transaction";
import type { SharedDenominator } from "./internal";

/** Joins the shared denominator of this code, or makes it under the label of whoever names it first. */
export async function joinSharedDenominator(
  tx: TxCtx,
  code: string,
  label: string,
): Promise<SharedDenominator> {
  await tx.db
    .insert(sharedDenominators)
    .values({ id: uuidv7(), code, label })
    .onConflictDoNothing({ target: sharedDenominators.code });
  const [shared] = await tx.db.select().from(sharedDenominators).where(eq(sharedDenominators.code, code));
  if (!shared) throw new Error("The shared denominator was neither found nor made.");
  return shared;
}
