// Adds up what the steps of both test commands left behind and prints the closing line.
import { readdirSync, readFileSync } from "node:fs";
import path from "node:path";

const [folder = "", status = "1"] = process.argv.slice(2);
const outcomes = readdirSync(folder)
  .filter((name) => name.endsWith(".outcome.json"))
  .map((name) => JSON.parse(readFileSync(path.join(folder, name), "utf8")));
const passed = outcomes.reduce((sum, outcome) => sum + outcome.passed, 0);
let failed = outcomes.reduce((sum, outcome) => sum + outcome.failed, 0);
// A command that ended badly without a failed step (killed, say) is a failure too.
if (status !== "0" && failed === 0) failed = 1;
if (passed === 0 && failed === 0) failed = 1;
console.log(`${passed} passed, ${failed} failed`);
process.exit(failed === 0 ? 0 : 1);
