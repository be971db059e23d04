import { describe, expect, it } from "vitest";
import {
  countFailure,
  secondsBlocked,
  takeBack,
  type ThrottleState,
} from "@/lib/services/sessions/throttle-rule";

const START = new Date("2026-12-07T09:00:00Z");
const later = (seconds: number) => new Date(START.valueOf() + seconds * 1000);
const fresh: ThrottleState = { failures: 0, windowStartedAt: START, blockedUntil: null };
const FREE = 10;

function after(failures: number): ThrottleState {
  let state = fresh;
  for (let count = 0; count < failures; count += 1) state = countFailure(state, START, FREE);
  return state;
}

describe("countFailure", () => {
  it("blocks nothing before the last free try, then for 30 seconds, doubling up to 15 minutes", () => {
    expect(secondsBlocked(after(FREE - 1), START)).toBe(0);
    expect([10, 11, 12, 13, 14, 15, 16, 400].map((count) => secondsBlocked(after(count), START))).toEqual([
      30, 60, 120, 240, 480, 900, 900, 900,
    ]);
  });

  it("begins anew an hour after the first failure", () => {
    const state = countFailure(after(40), later(3600), FREE);
    expect(state).toEqual({ failures: 1, windowStartedAt: later(3600), blockedUntil: null });
    expect(countFailure(after(40), later(3599), FREE).failures).toBe(41);
  });
});

describe("secondsBlocked", () => {
  it("ends at the instant that was set", () => {
    const blocked = after(FREE);
    expect(secondsBlocked(blocked, later(29.5))).toBe(1);
    expect(secondsBlocked(blocked, later(30))).toBe(0);
  });
});

describe("takeBack", () => {
  it("takes one try back and the block that it caused, but no earlier failures", () => {
    expect(takeBack(after(FREE), FREE)).toEqual({ failures: 9, windowStartedAt: START, blockedUntil: null });
    expect(takeBack(after(12), FREE).blockedUntil).not.toBeNull();
    expect(takeBack(fresh, FREE).failures).toBe(0);
  });
});
