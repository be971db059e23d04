import { DomainError } from "@/lib/errors/domain-error";
import type { UploadSheet } from "./raw-rows";
import { readCsv } from "./read-csv";
import { readXlsx } from "./read-xlsx";
import { readingMessages } from "./reading-messages";

const ZIP_START = [0x50, 0x4b];
/** Older workbooks, and newer ones under a password, are compound files. */
const COMPOUND_START = [0xd0, 0xcf, 0x11, 0xe0];
const TEXT_NAME = /\.(csv|tsv|txt)$/i;

/** Decides by the first bytes what a file is, and reads it. Runs in the reading worker; see read-upload.ts. */
export function readBytes(bytes: Uint8Array, fileName: string): UploadSheet {
  if (bytes.length === 0) throw new DomainError("invalid", readingMessages.empty);
  if (startsWith(bytes, COMPOUND_START))
    throw new DomainError("unsupported-type", readingMessages.oldOrProtected);
  if (startsWith(bytes, ZIP_START) && !TEXT_NAME.test(fileName)) return readXlsx(bytes);
  if (TEXT_NAME.test(fileName)) return readCsv(bytes);
  throw new DomainError("unsupported-type", readingMessages.unknownType);
}

function startsWith(bytes: Uint8Array, start: number[]): boolean {
  return start.every((byte, index) => bytes[index] === byte);
}
