import { readFileSync, readdirSync } from "node:fs";
import path from "node:path";
import { parseReferenceFile, type ReferenceFile } from "./case-format";

export interface LoadedFile {
  name: string;
  /** Null where the file couldn't be read as reference cases; `problem` says why. */
  file: ReferenceFile | null;
  problem: string | null;
}

/** Reads every JSON file of a folder, in the order of their names. Errors: those of reading the folder itself. */
export function loadCases(folder: string): LoadedFile[] {
  const names = readdirSync(folder).filter((name) => name.toLowerCase().endsWith(".json"));
  return names.sort().map((name) => loadFile(folder, name));
}

function loadFile(folder: string, name: string): LoadedFile {
  try {
    const json: unknown = JSON.parse(readFileSync(path.join(folder, name), "utf8"));
    return { name, file: parseReferenceFile(json), problem: null };
  } catch (error) {
    return { name, file: null, problem: error instanceof Error ? error.message : String(error) };
  }
}
