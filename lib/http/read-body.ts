import { DomainError } from "@/lib/errors";

/** Reads a body while counting, so that a missing or lying Content-Length can't fill the memory. */
export async function readBytes(request: Request, limit: number): Promise<Uint8Array> {
  const tooLarge = () =>
    new DomainError("too-large", `At most ${Math.floor(limit / 1024)} KB can be sent here.`);
  if (Number(request.headers.get("content-length") ?? 0) > limit) throw tooLarge();
  if (!request.body) return new Uint8Array();
  const reader = request.body.getReader();
  const chunks: Uint8Array[] = [];
  let length = 0;
  for (;;) {
    const { done, value } = await reader.read();
    if (done) break;
    length += value.byteLength;
    if (length > limit) {
      await reader.cancel();
      throw tooLarge();
    }
    chunks.push(value);
  }
  const bytes = new Uint8Array(length);
  let offset = 0;
  for (const chunk of chunks) {
    bytes.set(chunk, offset);
    offset += chunk.byteLength;
  }
  return bytes;
}

/** A JSON body; an empty one is an empty object. Wrong type 415, unreadable 422. */
export async function readJson(request: Request, limit: number): Promise<unknown> {
  const bytes = await readBytes(request, limit);
  if (bytes.byteLength === 0) return {};
  const type = request.headers.get("content-type")?.split(";")[0]?.trim().toLowerCase();
  if (type !== "application/json") throw new DomainError("unsupported-type", "Send JSON (application/json).");
  try {
    const text = new TextDecoder("utf-8", { fatal: true }).decode(bytes);
    return JSON.parse(text) as unknown;
  } catch {
    throw new DomainError("invalid", "The JSON can't be read.");
  }
}
