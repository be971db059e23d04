import "server-only";
import { subscribe } from "node:diagnostics_channel";
import type { IncomingMessage } from "node:http";

/** Methods that the web's Request can't be made with. */
const NOT_FOR_REQUESTS = new Set(["TRACE", "TRACK", "CONNECT"]);
/** Stands for them: a method that no route knows. */
const UNKNOWN_METHOD = "UNKNOWN";

/**
 * Changes what the framework would trip over, and answer with a bare 500, into something that it refuses in order:
 * addresses whose percent signs don't spell UTF-8, and methods that can't be handed on. Runs before anything reads
 * the request.
 */
export function tameOddRequests(): void {
  subscribe("http.server.request.start", (message) => {
    const { request } = message as { request: IncomingMessage };
    if (request.url !== undefined) request.url = readableAddress(request.url);
    if (NOT_FOR_REQUESTS.has(request.method ?? "")) request.method = UNKNOWN_METHOD;
  });
}

/** The address with its percent signs taken literally where they can't be read otherwise. */
export function readableAddress(address: string): string {
  const end = address.indexOf("?");
  const path = end === -1 ? address : address.slice(0, end);
  try {
    decodeURIComponent(path);
    return address;
  } catch {
    return path.replaceAll("%", "%25") + address.slice(path.length);
  }
}
