import { createHash } from "node:crypto";
import { existsSync } from "node:fs";
import { mkdir, readdir, readFile, rename, writeFile } from "node:fs/promises";
import path from "node:path";
import { PGlite } from "@electric-sql/pglite";
import { wrapEmbedded } from "@/db/client";

const folder = path.resolve(import.meta.dirname, "../.tmp");

/** Where the migrated image for the present migrations lies; a changed migration makes a new one. */
export async function imagePath(): Promise<string> {
  const migrations = path.resolve(import.meta.dirname, "../../db/migrations");
  const hash = createHash("sha256");
  for (const name of (await readdir(migrations)).filter((each) => each.endsWith(".sql")).sort()) {
    hash.update(await readFile(path.join(migrations, name)));
  }
  return path.join(folder, `image-${hash.digest("hex").slice(0, 16)}.tar`);
}

/** Migrates once; every suite then starts from a copy, which is several times quicker. */
export async function makeImage(): Promise<void> {
  const file = await imagePath();
  if (existsSync(file)) return;
  await mkdir(folder, { recursive: true });
  const engine = await PGlite.create();
  await wrapEmbedded(engine);
  const dump = await engine.dumpDataDir("none");
  await engine.close();
  // Written beside and renamed, so that another process never reads half a file.
  const half = `${file}.${process.pid}`;
  await writeFile(half, Buffer.from(await dump.arrayBuffer()));
  await rename(half, file);
}
