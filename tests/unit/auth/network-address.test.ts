import { describe, expect, it } from "vitest";
import { networkAddress, PEER_HEADER } from "@/lib/auth/network-address";

describe("networkAddress", () => {
  it("takes the socket's address, never what the caller says of itself", () => {
    const headers = { "x-forwarded-for": "203.0.113.9", [PEER_HEADER]: "198.51.100.7" };
    expect(networkAddress(headers, false)).toBe("198.51.100.7");
    expect(networkAddress({ "x-forwarded-for": "203.0.113.9" }, false)).toBeNull();
  });

  it("takes what a trusted proxy appended last, not what the caller put before it", () => {
    const headers = { "x-forwarded-for": "10.0.0.1, 203.0.113.9", [PEER_HEADER]: "127.0.0.1" };
    expect(networkAddress(headers, true)).toBe("203.0.113.9");
    expect(networkAddress({ [PEER_HEADER]: "127.0.0.1" }, true)).toBe("127.0.0.1");
  });

  it("counts IPv4 in IPv6 dress as itself, and a /64 as one caller", () => {
    expect(networkAddress({ [PEER_HEADER]: "::ffff:198.51.100.7" }, false)).toBe("198.51.100.7");
    const first = networkAddress({ [PEER_HEADER]: "2001:db8:1:2:aaaa::1" }, false);
    const second = networkAddress({ [PEER_HEADER]: "2001:DB8:1:2:bbbb:1:2:3" }, false);
    expect(first).toBe("2001:db8:1:2::/64");
    expect(second).toBe(first);
    expect(networkAddress({ [PEER_HEADER]: "fe80::1%eth0" }, false)).toBe("fe80:0:0:0::/64");
  });
});
