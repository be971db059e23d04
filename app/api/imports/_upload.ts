import { DomainError } from "@/lib/errors";
import { readBytes } from "@/lib/http";
import { requireAction, type Actor } from "@/lib/policy";
import { importWords } from "@/lib/strings/imports";
import { MAX_UPLOAD_BYTES } from "@/lib/workbook";

/** What a form needs round the file itself: boundaries and the headings of its parts. */
const FORM_BYTES = 64 * 1024;

export interface UploadedFile {
  fileName: string;
  bytes: Uint8Array;
  signal: AbortSignal;
}

/** The one file of a multipart form. Nothing is read for somebody who may not bring sheets in anyhow. */
export async function readUploadedFile(actor: Actor, request: Request): Promise<UploadedFile> {
  requireAction(actor, "import.create");
  const type = request.headers.get("content-type") ?? "";
  if (!/^multipart\/form-data\s*;.*boundary=/i.test(type)) {
    throw new DomainError("unsupported-type", importWords.sendAsForm);
  }
  const bytes = await readBytes(request, MAX_UPLOAD_BYTES + FORM_BYTES);
  const files = [...(await parseForm(bytes, type)).entries()].filter(isFile);
  const [only] = files;
  if (!only || files.length > 1 || only[0] !== "file") {
    throw new DomainError("invalid", importWords.oneFile, {
      errors: [{ path: "file", message: importWords.oneFile }],
    });
  }
  const [, file] = only;
  return {
    // Some browsers send the whole path.
    fileName: file.name.split(/[\\/]/).at(-1) || importWords.unnamedFile,
    bytes: new Uint8Array(await file.arrayBuffer()),
    signal: request.signal,
  };
}

function isFile(entry: [string, FormDataEntryValue]): entry is [string, File] {
  return typeof entry[1] !== "string";
}

async function parseForm(bytes: Uint8Array, type: string): Promise<FormData> {
  try {
    return await new Response(new Uint8Array(bytes), { headers: { "Content-Type": type } }).formData();
  } catch {
    throw new DomainError("invalid", importWords.unreadableForm);
  }
}
