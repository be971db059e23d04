import { existsSync } from "node:fs";
import { reportFolder } from "./reference-cases";

/** `npm run reference -- DIR`: checks the statistics against every reference case of a folder. */
function main(folder: string | undefined): number {
  if (folder === undefined) {
    console.error("Usage: npm run reference -- DIR");
    return 2;
  }
  if (!existsSync(folder)) {
    console.error(`There is no folder ${folder}.`);
    return 2;
  }
  const { lines, failed } = reportFolder(folder);
  console.log(lines.join("\n"));
  return failed === 0 ? 0 : 1;
}

process.exitCode = main(process.argv[2]);
