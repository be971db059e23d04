import "server-only";
import { eq } from "drizzle-orm";
import { hospital } from "@/db/schema";
import type { Ctx } from "@/db/transaction";
import { DomainError } from "@/lib/errors";
import { requireAction } from "@/lib/policy";
import type { HospitalRecord } from "@/lib/schemas/hospital";

/** The only row's id. */
export const HOSPITAL_ID = 1;

const columns = {
  name: hospital.name,
  timeZone: hospital.timeZone,
  dueDay: hospital.dueDay,
  holidays: hospital.holidays,
  version: hospital.version,
};

/** The row, or null before set-up. Inside verbs: no question of who asks. */
export async function findHospitalRow({ db }: Pick<Ctx, "db">): Promise<HospitalRecord | null> {
  const [row] = await db.select(columns).from(hospital).where(eq(hospital.id, HOSPITAL_ID));
  return row ?? null;
}

/** The settings; for verbs that need due day or time zone, and for whoever may read settings. */
export async function getHospital({ ctx }: { ctx: Ctx }): Promise<HospitalRecord> {
  requireAction(ctx.actor, "settings.read");
  const row = await findHospitalRow(ctx);
  if (!row) throw new DomainError("not-found", "The hospital isn't set up yet.");
  return row;
}

/** The name alone, which the sign-in page shows to anybody. */
export async function getHospitalName({ db }: Pick<Ctx, "db">): Promise<string> {
  const row = await findHospitalRow({ db });
  return row?.name ?? "";
}
