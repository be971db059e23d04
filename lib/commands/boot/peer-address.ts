import "server-only";
import { subscribe } from "node:diagnostics_channel";
import type { IncomingMessage } from "node:http";
import { PEER_HEADER } from "@/lib/auth/network-address";
import { env } from "@/lib/config/env";

/** What a caller could say about itself or about the address it reached. */
const FORWARDED = [
  "forwarded",
  "x-forwarded-for",
  "x-forwarded-host",
  "x-forwarded-port",
  "x-forwarded-proto",
  "x-real-ip",
];

/**
 * Writes the socket's address into a header of every request before anything reads it: handlers see no socket.
 * Headers by which a caller could pose as somebody else go, unless a trusted proxy in front sets them.
 */
export function nameThePeer(): void {
  const trustProxy = env().EBBLINE_TRUST_PROXY === "1";
  subscribe("http.server.request.start", (message) => {
    const { request } = message as { request: IncomingMessage };
    if (!trustProxy) for (const name of FORWARDED) delete request.headers[name];
    delete request.headers[PEER_HEADER];
    const address = request.socket.remoteAddress;
    if (address) request.headers[PEER_HEADER] = address;
  });
}
