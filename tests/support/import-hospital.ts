import { and, eq } from "drizzle-orm";
import { uuidv7 } from "uuidv7";
import { auditEntries, sharedDenominators, signals, tallies, wardReturns } from "@/db/schema";
import { isDomainError, type DomainError } from "@/lib/errors";
import { asMonth } from "@/lib/indicators/month";
import type { Actor } from "@/lib/policy";
import { checkImport } from "@/lib/services/imports";
import { csvUpload, makeDataFolder, type SheetRow } from "./sheets";
import { makeTestStore, TEST_NOW } from "./store";

/** Two wards that report falls and harm out of the same bed days, late observations, and infections that a team counts. */
export async function makeImportHospital() {
  const dropFolder = await makeDataFolder();
  const store = await makeTestStore();
  const osier = await store.addWard("OSIER", { name: "Osier" });
  const tern = await store.addWard("TERN", { name: "Tern" });
  const sharedId = uuidv7();
  await store.db.insert(sharedDenominators).values({ id: sharedId, code: "OBD", label: "Occupied bed days" });
  const shared = { sharedDenominatorId: sharedId };
  const falls = await store.addIndicator("FALLS", { name: "Falls", kind: "rate", per: 1000, ...shared });
  const harm = await store.addIndicator("HARM", { name: "Patients harmed", ...shared });
  const obs = await store.addIndicator("OBS", { name: "Late observations" });
  const team = { team: "infection_control", numeratorBy: "team" } as const;
  const cath = await store.addIndicator("CATH", {
    name: "Catheter infections",
    kind: "rate",
    per: 1000,
    ...team,
  });
  for (const ward of [osier, tern]) {
    for (const indicator of [falls, harm, obs, cath]) await store.assign(ward.id, indicator.id, "2024-01");
  }
  const nurse = store.nurseOf(osier.id);

  const check = (rows: readonly SheetRow[], actor: Actor = store.lead, at: Date = TEST_NOW) =>
    checkImport({ ctx: store.ctxFor(actor, at), input: csvUpload(rows) });

  async function tallyOf(indicatorId: string, month: string, wardId = osier.id) {
    const [row] = await store.db
      .select()
      .from(tallies)
      .where(
        and(
          eq(tallies.wardId, wardId),
          eq(tallies.indicatorId, indicatorId),
          eq(tallies.month, asMonth(month)),
        ),
      );
    return row ?? null;
  }

  async function returnOf(month: string, wardId = osier.id) {
    const [row] = await store.db
      .select()
      .from(wardReturns)
      .where(and(eq(wardReturns.wardId, wardId), eq(wardReturns.month, asMonth(month))));
    return row ?? null;
  }

  const auditsOf = (action: string) =>
    store.db.select().from(auditEntries).where(eq(auditEntries.action, action)).orderBy(auditEntries.seq);

  const signalsOf = (indicatorId: string) =>
    store.db.select().from(signals).where(eq(signals.indicatorId, indicatorId));

  return {
    ...store,
    osier,
    tern,
    falls,
    harm,
    obs,
    cath,
    nurse,
    check,
    tallyOf,
    returnOf,
    auditsOf,
    signalsOf,
    close: async () => {
      await store.close();
      await dropFolder();
    },
  };
}

export type ImportHospital = Awaited<ReturnType<typeof makeImportHospital>>;

/** The DomainError that work ends with; fails where it succeeds or throws something else. */
export async function refusal(work: Promise<unknown>): Promise<DomainError> {
  try {
    await work;
  } catch (error) {
    if (isDomainError(error)) return error;
    throw error;
  }
  throw new Error("This should have been refused.");
}
