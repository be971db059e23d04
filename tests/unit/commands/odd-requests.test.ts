import { describe, expect, it } from "vitest";
import { readableAddress } from "@/lib/commands/boot/odd-requests";

describe("readableAddress", () => {
  it.each(["/", "/api/wards/OSIER?x=%ff", "/charts/%C3%A9", "/a%20b?c=%", "*"])(
    "leaves %s alone",
    (address) => {
      expect(readableAddress(address)).toBe(address);
    },
  );

  it.each([
    ["/charts/%ff/FALLS", "/charts/%25ff/FALLS"],
    ["/%?a=%zz", "/%25?a=%zz"],
    ["/%20/%c3%28", "/%2520/%25c3%2528"],
  ])("takes the signs of %s literally", (address, readable) => {
    expect(readableAddress(address)).toBe(readable);
    expect(decodeURIComponent(readable.split("?")[0] ?? "")).toBe(address.split("?")[0]);
  });
});
