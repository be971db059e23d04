import { DomainError } from "@/lib/errors/domain-error";
import type { UploadSheet } from "./raw-rows";
import { readingMessages } from "./reading-messages";
import { SheetBuilder } from "./sheet-builder";
import { readWorkbookParts } from "./workbook-parts";
import { WorksheetReader } from "./worksheet-reader";
import { readXml } from "./xml-reader";
import { ZipArchive } from "./zip-archive";

const NEEDED_PARTS = ["[Content_Types].xml", "xl/workbook.xml"];

/** Reads the sheet of tallies from the bytes of a workbook; nothing in them is trusted. */
export function readXlsx(bytes: Uint8Array): UploadSheet {
  const archive = new ZipArchive(bytes);
  if (!NEEDED_PARTS.every((part) => archive.has(part))) {
    throw new DomainError("unsupported-type", readingMessages.notWorkbook);
  }
  if (archive.has("xl/vbaProject.bin")) throw new DomainError("unsupported-type", readingMessages.macros);
  const parts = readWorkbookParts(archive);
  const builder = new SheetBuilder();
  readXml(archive, parts.sheet.part, new WorksheetReader(parts, builder));
  return builder.finish("xlsx", parts.sheet.name);
}
