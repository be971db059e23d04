import { Inflate } from "fflate";
import { DomainError, isDomainError } from "@/lib/errors/domain-error";
import { crc32 } from "./crc32";
import { readingMessages } from "./reading-messages";
import { MAX_UNPACKED_BYTES } from "./upload-limits";
import { readZipDirectory, type ZipEntry } from "./zip-directory";

const LOCAL_SIGNATURE = 0x04034b50;
const LOCAL_LENGTH = 30;
const STORED = 0;
const DEFLATED = 8;
/** Deflate grows a thousandfold at most, so that a piece never becomes more than 8 MB at once. */
const PIECE_BYTES = 8 * 1024;

type Sink = (piece: Uint8Array) => void;

const damaged = () => new DomainError("invalid", readingMessages.damaged);

/**
 * A zip whose parts are unpacked piece by piece. All of them are unpacked once at the start, also those that nobody
 * reads: whoever opens the kept file later would unpack them too.
 * @throws DomainError too-large where they come to too much in sum, invalid where a size or checksum is wrong
 */
export class ZipArchive {
  private readonly entries: Map<string, ZipEntry>;

  constructor(private readonly bytes: Uint8Array) {
    this.entries = new Map(readZipDirectory(bytes).map((entry) => [entry.name, entry]));
    this.checkContents();
  }

  has(name: string): boolean {
    return this.entries.has(name.toLowerCase());
  }

  /** Unpacks a part into `sink`. */
  read(name: string, sink: Sink): void {
    const entry = this.entries.get(name.toLowerCase());
    if (!entry) throw damaged();
    this.unpack(entry, sink);
  }

  /** Too much is looked for in every part before damage in any is spoken of: a lie about sizes is both. */
  private checkContents(): void {
    let unpacked = 0;
    let isDamaged = false;
    for (const entry of this.entries.values()) {
      const start = unpacked;
      let crc = 0;
      this.unpack(entry, (piece) => {
        unpacked += piece.length;
        if (unpacked > MAX_UNPACKED_BYTES) {
          throw new DomainError(
            "too-large",
            readingMessages.tooMuchUnpacked(MAX_UNPACKED_BYTES / 1024 / 1024),
          );
        }
        crc = crc32(piece, crc);
      });
      if (unpacked - start !== entry.size || crc !== entry.crc) isDamaged = true;
    }
    if (isDamaged) throw damaged();
  }

  private unpack(entry: ZipEntry, sink: Sink): void {
    const data = this.packedData(entry);
    if (entry.method === STORED) {
      if (data.length > 0) sink(data);
      return;
    }
    if (entry.method !== DEFLATED) throw damaged();
    try {
      inflatePieces(data, sink);
    } catch (error) {
      throw isDomainError(error) ? error : damaged();
    }
  }

  private packedData(entry: ZipEntry): Uint8Array {
    const { bytes } = this;
    const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
    const header = entry.headerOffset;
    if (header + LOCAL_LENGTH > bytes.length || view.getUint32(header, true) !== LOCAL_SIGNATURE)
      throw damaged();
    const start =
      header + LOCAL_LENGTH + view.getUint16(header + 26, true) + view.getUint16(header + 28, true);
    if (start + entry.compressedSize > bytes.length) throw damaged();
    return bytes.subarray(start, start + entry.compressedSize);
  }
}

function inflatePieces(data: Uint8Array, sink: Sink): void {
  const inflate = new Inflate((piece) => {
    if (piece.length > 0) sink(piece);
  });
  for (let start = 0; start < data.length; start += PIECE_BYTES) {
    const end = Math.min(start + PIECE_BYTES, data.length);
    inflate.push(data.subarray(start, end), end === data.length);
  }
}
