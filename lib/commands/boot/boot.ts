import "server-only";
import path from "node:path";
import { uuidv7 } from "uuidv7";
import { dataFolder, getStore } from "@/db/client";
import type { Ctx } from "@/db/transaction";
import { fixedClock, now } from "@/lib/config/clock";
import { folderRefusal, isDemoFolder, keptSecret } from "@/lib/config/data-folder.mjs";
import { env, supplyEnv } from "@/lib/config/env";
import { invitationLink, publicUrl } from "@/lib/config/public-url";
import { systemActor } from "@/lib/policy";
import { setUpHospital } from "@/lib/services/hospital";
import { inviteFirstLead } from "@/lib/services/people";
import { stopGracefully } from "./graceful-stop";
import { keepTime } from "./keep-time";
import { tameOddRequests } from "./odd-requests";
import { nameThePeer } from "./peer-address";

/**
 * Makes the process ready, or ends it: a server that can't reach its data would answer every request with 500
 * and look alive.
 */
export async function boot(): Promise<void> {
  try {
    await start();
  } catch (error) {
    console.error(`Ebbline can't start. ${reasonOf(error)}`);
    process.exit(1);
  }
}

async function start(): Promise<void> {
  checkFolder();
  supplyEnv({
    NEXTAUTH_SECRET: env().NEXTAUTH_SECRET ?? keptSecret(dataFolder()),
    NEXTAUTH_URL: publicUrl(),
  });
  nameThePeer();
  tameOddRequests();
  const store = await getStore();
  stopGracefully();

  const ctx: Ctx = { actor: systemActor("set-up"), db: store.db, now: now(), requestId: uuidv7() };
  const { HOSPITAL_NAME, HOSPITAL_TIME_ZONE, EBBLINE_DEMO } = env();
  await setUpHospital({ ctx, input: { name: HOSPITAL_NAME, timeZone: HOSPITAL_TIME_ZONE } });
  if (EBBLINE_DEMO === "0") await showFirstLink(ctx);
  keepTime(store.db);
}

function checkFolder(): void {
  const isDemo = env().EBBLINE_DEMO === "1";
  const refusal = folderRefusal(dataFolder(), isDemo);
  if (refusal) throw new Error(refusal);
  if (isDemo && !isDemoFolder(dataFolder())) {
    throw new Error(
      `EBBLINE_DEMO is for npm run demo alone; ${path.basename(dataFolder())} is no demo's folder.`,
    );
  }
  fixedClock();
}

async function showFirstLink(ctx: Ctx): Promise<void> {
  const invitation = await inviteFirstLead({ ctx });
  if (!invitation) return;
  console.log(
    [
      "",
      "Nobody can set Ebbline up yet. The first quality lead comes in by this link, which works once:",
      `  ${invitationLink(invitation.token)}`,
      "It holds for 7 days; a new one is printed with each start until it is used.",
      "",
    ].join("\n"),
  );
}

/** One line for whoever reads the console: the outermost message and, where a driver wrapped it, the cause. */
function reasonOf(error: unknown): string {
  if (!(error instanceof Error)) return String(error);
  const cause = error.cause instanceof Error ? ` (${error.cause.message})` : "";
  return `${error.message}${cause}`;
}
