import { mkdtemp, rm } from "node:fs/promises";
import os from "node:os";
import path from "node:path";
import { supplyEnv } from "@/lib/config/env";

/** One row of a sheet as somebody would type it: blanks are empty text. */
export type SheetRow = [
  ward: string,
  indicator: string,
  month: string,
  numerator: string | number,
  denominator: string | number,
  notCollected?: string,
  note?: string,
];

/** A CSV file as an upload. */
export function csvUpload(rows: readonly SheetRow[], fileName = "counts.csv") {
  const lines = rows.map((row) => Array.from({ length: 7 }, (_, index) => row[index] ?? "").join(","));
  const text = ["Ward,Indicator,Month,Numerator,Denominator,Not collected,Note", ...lines].join("\r\n");
  return { fileName, bytes: new TextEncoder().encode(text) };
}

/** A data folder of its own for uploaded files, taken away by the function that it answers. */
export async function makeDataFolder(): Promise<() => Promise<void>> {
  const folder = await mkdtemp(path.join(os.tmpdir(), "ebbline-files-"));
  supplyEnv({ EBBLINE_DATA: folder });
  return () => rm(folder, { recursive: true, force: true });
}
