/** A download: always an attachment, never guessed at by the browser, file name in plain ASCII. */
export function fileResponse(bytes: Uint8Array, fileName: string, contentType: string): Response {
  const safeName = fileName.replace(/[^A-Za-z0-9._-]+/g, "-");
  return new Response(new Uint8Array(bytes), {
    headers: {
      "Content-Type": contentType,
      "Content-Disposition": `attachment; filename="${safeName}"`,
      "Content-Length": String(bytes.byteLength),
      "Cache-Control": "no-store",
    },
  });
}
