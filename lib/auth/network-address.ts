import { env } from "@/lib/config/env";

/** Set by the server itself on every request, over whatever was sent; see the start of the process. */
export const PEER_HEADER = "x-ebbline-peer";

type Headers = Record<string, string | undefined>;

/**
 * The caller's network address: the socket's, or what a trusted proxy in front appended last. What a caller says
 * about itself never counts. Null where it isn't known.
 */
export function networkAddress(
  headers: Headers,
  trustProxy = env().EBBLINE_TRUST_PROXY === "1",
): string | null {
  const forwarded = trustProxy ? headers["x-forwarded-for"]?.split(",").at(-1)?.trim() : undefined;
  const address = forwarded ?? headers[PEER_HEADER];
  return address ? plainAddress(address) : null;
}

/** IPv4 in its IPv6 dress counts as itself, and an IPv6 customer has a whole /64 to choose from. */
function plainAddress(address: string): string {
  const bare = address.replace(/^::ffff:/i, "").replace(/%.*$/, "");
  if (!bare.includes(":")) return bare;
  const [head = "", tail = ""] = bare.toLowerCase().split("::");
  const front = head.split(":").filter(Boolean);
  const back = tail.split(":").filter(Boolean);
  const gap = bare.includes("::") ? Array<string>(Math.max(0, 8 - front.length - back.length)).fill("0") : [];
  return `${[...front, ...gap, ...back].slice(0, 4).join(":")}::/64`;
}
