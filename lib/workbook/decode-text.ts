import { DomainError } from "@/lib/errors/domain-error";
import { readingMessages } from "./reading-messages";

/**
 * Bytes of a text file as text: UTF-16 by its byte order mark, else UTF-8, with the mark taken off.
 * @throws DomainError unsupported-type where the bytes are no such text, or hold a NUL
 */
export function decodeText(bytes: Uint8Array): string {
  const encoding =
    bytes[0] === 0xff && bytes[1] === 0xfe
      ? "utf-16le"
      : bytes[0] === 0xfe && bytes[1] === 0xff
        ? "utf-16be"
        : "utf-8";
  if (encoding === "utf-8" && bytes.includes(0))
    throw new DomainError("unsupported-type", readingMessages.notText);
  const text = decode(bytes, encoding);
  if (text.includes("\0")) throw new DomainError("unsupported-type", readingMessages.notText);
  return text;
}

function decode(bytes: Uint8Array, encoding: string): string {
  try {
    return new TextDecoder(encoding, { fatal: true }).decode(bytes);
  } catch {
    throw new DomainError("unsupported-type", readingMessages.notUnicode);
  }
}
