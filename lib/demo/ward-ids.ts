import type { Ctx } from "@/db/transaction";
import { getWardByCode } from "@/lib/services/wards";
import { demoWards } from "./hospital";

/** Ids of the demo's wards by code. */
export async function findWardsByCode(ctx: Ctx): Promise<(code: string) => string> {
  const ids = new Map<string, string>();
  for (const { code } of demoWards) ids.set(code, (await getWardByCode({ ctx, code })).id);
  return (code) => {
    const id = ids.get(code);
    if (id === undefined) throw new Error(`The demo has no ward ${code}.`);
    return id;
  };
}
