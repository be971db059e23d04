import { SaxesParser } from "saxes";
import { DomainError, isDomainError } from "@/lib/errors/domain-error";
import { readingMessages } from "./reading-messages";
import { MAX_XML_DEPTH } from "./upload-limits";
import type { ZipArchive } from "./zip-archive";

/** Names come without their prefix: writers differ in the prefixes that they use. */
export interface XmlHandler {
  open?: (name: string, attributes: Readonly<Record<string, string>>) => void;
  close?: (name: string) => void;
  text?: (text: string) => void;
}

/**
 * Reads one XML part of a workbook piece by piece, as UTF-8 or, by its byte order mark, UTF-16.
 * @throws DomainError invalid where it isn't well formed, nests too deeply or declares a document type or entities
 */
export function readXml(archive: ZipArchive, name: string, handler: XmlHandler): void {
  const parser = createParser(handler);
  const decoding: { by?: TextDecoder } = {};
  try {
    archive.read(name, (piece) => {
      decoding.by ??= new TextDecoder(encodingOf(piece), { fatal: true });
      parser.write(decoding.by.decode(piece, { stream: true }));
    });
    if (decoding.by) parser.write(decoding.by.decode());
    parser.close();
  } catch (error) {
    throw isDomainError(error) ? error : new DomainError("invalid", readingMessages.damaged);
  }
}

export function localName(name: string): string {
  const colon = name.indexOf(":");
  return colon < 0 ? name : name.slice(colon + 1);
}

function createParser(handler: XmlHandler) {
  const parser = new SaxesParser({ position: false, xmlns: false });
  let depth = 0;
  parser.on("doctype", () => {
    throw new DomainError("invalid", readingMessages.doctype);
  });
  parser.on("opentag", (tag) => {
    depth += 1;
    if (depth > MAX_XML_DEPTH) throw new DomainError("invalid", readingMessages.damaged);
    handler.open?.(localName(tag.name), tag.attributes);
  });
  parser.on("closetag", (tag) => {
    depth -= 1;
    handler.close?.(localName(tag.name));
  });
  const text = handler.text;
  if (text) {
    parser.on("text", text);
    parser.on("cdata", text);
  }
  return parser;
}

function encodingOf(start: Uint8Array): string {
  if (start[0] === 0xff && start[1] === 0xfe) return "utf-16le";
  if (start[0] === 0xfe && start[1] === 0xff) return "utf-16be";
  return "utf-8";
}
