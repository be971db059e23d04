import "server-only";
import { createHash, randomUUID } from "node:crypto";
import { mkdir, open, readFile, rename, unlink } from "node:fs/promises";
import path from "node:path";
import { dataFolder } from "@/db/client";

const CHECKSUM = /^[0-9a-f]{64}$/;

/** SHA-256 in hex: the name by which a file is kept. */
export function checksumOf(bytes: Uint8Array): string {
  return createHash("sha256").update(bytes).digest("hex");
}

/**
 * Keeps bytes in the data folder under their checksum and answers it. The same bytes are kept once. Written beside,
 * forced to the disk and renamed, so that a file is there whole or not at all. Never called inside a transaction.
 */
export async function putFile(bytes: Uint8Array): Promise<string> {
  const checksum = checksumOf(bytes);
  const target = pathOf(checksum);
  if (await getFile(checksum)) return checksum;
  await mkdir(path.dirname(target), { recursive: true, mode: 0o700 });
  const half = `${target}.${randomUUID()}`;
  try {
    const file = await open(half, "wx", 0o600);
    try {
      await file.writeFile(bytes);
      await file.sync();
    } finally {
      await file.close();
    }
    await rename(half, target);
  } catch (error) {
    await unlink(half).catch(() => undefined);
    throw error;
  }
  return checksum;
}

/** The bytes of a checksum, or null where none are kept or what lies there is no longer what was put. */
export async function getFile(checksum: string): Promise<Uint8Array | null> {
  if (!CHECKSUM.test(checksum)) return null;
  try {
    const bytes = new Uint8Array(await readFile(pathOf(checksum)));
    return checksumOf(bytes) === checksum ? bytes : null;
  } catch (error) {
    if (error instanceof Error && "code" in error && error.code === "ENOENT") return null;
    throw error;
  }
}

/** Two levels, so that no folder holds more than a few hundred entries. */
function pathOf(checksum: string): string {
  return path.join(dataFolder(), "files", checksum.slice(0, 2), checksum);
}
