import { DomainError } from "@/lib/errors/domain-error";
import { readingMessages } from "./reading-messages";
import { MAX_ZIP_ENTRIES } from "./upload-limits";

/** One part of a zip by its central directory, which a reader can trust more than what stands before each part. */
export interface ZipEntry {
  /** Lower case, with forward slashes and none at the start. */
  name: string;
  method: number;
  encrypted: boolean;
  crc: number;
  compressedSize: number;
  /** As declared; it can lie. */
  size: number;
  headerOffset: number;
}

const END_SIGNATURE = 0x06054b50;
const ENTRY_SIGNATURE = 0x02014b50;
const END_LENGTH = 22;
const ENTRY_LENGTH = 46;
const MAX_COMMENT = 65_535;
/** Bits of the flags: encrypted, strong encryption, masked directory. */
const ENCRYPTION_FLAGS = 0x0001 | 0x0040 | 0x2000;
const IN_EXTRA_FIELD = 0xffffffff;

const damaged = () => new DomainError("invalid", readingMessages.damaged);

/**
 * Lists the parts of a zip.
 * @throws DomainError invalid where the directory is damaged or a name stands there twice, too-large where there
 *   are too many parts, unsupported-type where a part is encrypted
 */
export function readZipDirectory(bytes: Uint8Array): ZipEntry[] {
  const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
  const end = findEnd(view);
  const count = view.getUint16(end + 10, true);
  if (count > MAX_ZIP_ENTRIES) throw new DomainError("too-large", readingMessages.tooManyParts);
  let offset = view.getUint32(end + 16, true);
  const entries = new Map<string, ZipEntry>();
  for (let index = 0; index < count; index += 1) {
    if (offset + ENTRY_LENGTH > end || view.getUint32(offset, true) !== ENTRY_SIGNATURE) throw damaged();
    const next =
      offset +
      ENTRY_LENGTH +
      view.getUint16(offset + 28, true) +
      view.getUint16(offset + 30, true) +
      view.getUint16(offset + 32, true);
    if (next > end) throw damaged();
    const entry = readEntry(bytes, view, offset);
    if (entry.encrypted) throw new DomainError("unsupported-type", readingMessages.encrypted);
    if (entries.has(entry.name)) throw damaged();
    entries.set(entry.name, entry);
    offset = next;
  }
  return [...entries.values()];
}

function findEnd(view: DataView): number {
  const lowest = Math.max(0, view.byteLength - END_LENGTH - MAX_COMMENT);
  for (let offset = view.byteLength - END_LENGTH; offset >= lowest; offset -= 1) {
    const isEnd =
      view.getUint32(offset, true) === END_SIGNATURE &&
      offset + END_LENGTH + view.getUint16(offset + 20, true) <= view.byteLength;
    if (isEnd) return offset;
  }
  throw damaged();
}

function readEntry(bytes: Uint8Array, view: DataView, offset: number): ZipEntry {
  const nameStart = offset + ENTRY_LENGTH;
  const nameEnd = nameStart + view.getUint16(offset + 28, true);
  const extraEnd = nameEnd + view.getUint16(offset + 30, true);
  const name = new TextDecoder().decode(bytes.subarray(nameStart, nameEnd));
  const sizes = wideSizes(view, nameEnd, extraEnd, {
    size: view.getUint32(offset + 24, true),
    compressedSize: view.getUint32(offset + 20, true),
    headerOffset: view.getUint32(offset + 42, true),
  });
  return {
    name: name.replaceAll("\\", "/").replace(/^\/+/, "").toLowerCase(),
    method: view.getUint16(offset + 10, true),
    encrypted: (view.getUint16(offset + 8, true) & ENCRYPTION_FLAGS) !== 0,
    crc: view.getUint32(offset + 16, true),
    ...sizes,
  };
}

type Sizes = Pick<ZipEntry, "size" | "compressedSize" | "headerOffset">;

/** Some writers put the sizes into the extra field for 64 bits, in this order, even where they are small. */
function wideSizes(view: DataView, start: number, end: number, sizes: Sizes): Sizes {
  const result = { ...sizes };
  for (let field = start; field + 4 <= end; field += 4 + view.getUint16(field + 2, true)) {
    if (view.getUint16(field, true) !== 0x0001) continue;
    let value = field + 4;
    for (const key of ["size", "compressedSize", "headerOffset"] as const) {
      if (result[key] !== IN_EXTRA_FIELD) continue;
      if (value + 8 > end) throw damaged();
      result[key] = Number(view.getBigUint64(value, true));
      value += 8;
    }
    break;
  }
  return result;
}
