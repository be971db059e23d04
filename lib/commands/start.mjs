// `npm start`: the built application on real data.
import "./boot/node-version.mjs";
import { folderRefusal, keptSecret } from "../config/data-folder.mjs";
import { hasBuild } from "./boot/fingerprints.mjs";
import { isPortFree, serve } from "./boot/serve.mjs";
import { giveUp, readEnvFile, readSettings } from "./boot/settings.mjs";

readEnvFile();
const settings = readSettings({ host: "127.0.0.1" });

if (process.env.EBBLINE_DEMO === "1") giveUp("EBBLINE_DEMO is for npm run demo alone.");
if (!hasBuild()) giveUp("There is no build yet. Run npm run build first.");
const refusal = folderRefusal(settings.folder, false);
if (refusal) giveUp(refusal);
if (!(await isPortFree(settings))) {
  giveUp(`Port ${settings.port} on ${settings.host} is in use. Choose another one with PORT.`);
}

const secret = process.env.NEXTAUTH_SECRET || keptSecret(settings.folder);
console.log(`Ebbline starts on ${settings.url}`);
process.exitCode = await serve(settings, { ...process.env, NEXTAUTH_SECRET: secret });
