import { describe, expect, it } from "vitest";
import { isDomainError } from "@/lib/errors";
import {
  applyTallyChange,
  BLANK_TALLY,
  differingFields,
  type TallyChange,
} from "@/lib/indicators/tally-change";

const counted = { ...BLANK_TALLY, numerator: 4, denominator: 100, note: "Busy" };
const lost = { ...BLANK_TALLY, notCollected: "Sheet lost" };
const awaiting = { ...BLANK_TALLY, numerator: 4, awaited: "pharmacy" };

function refusedPath(change: TallyChange, isShared = false): string | undefined {
  try {
    applyTallyChange(counted, change, isShared);
  } catch (error) {
    if (isDomainError(error, "invalid")) return error.errors[0]?.path;
    throw error;
  }
  return undefined;
}

describe("applyTallyChange", () => {
  it("keeps what is left out, and clears what is null", () => {
    expect(applyTallyChange(counted, { numerator: 5 }, false)).toEqual({ ...counted, numerator: 5 });
    expect(applyTallyChange(counted, { denominator: null }, false)).toEqual({
      ...counted,
      denominator: null,
    });
    expect(applyTallyChange(counted, { note: null }, false)).toEqual({ ...counted, note: null });
    expect(applyTallyChange(counted, {}, false)).toEqual(counted);
  });

  it("lets not collected clear the line's own figures, and a figure clear not collected", () => {
    expect(applyTallyChange(counted, { notCollected: "Lost" }, false)).toEqual({
      ...BLANK_TALLY,
      notCollected: "Lost",
      note: "Busy",
    });
    expect(applyTallyChange(lost, { numerator: 0 }, false)).toEqual({ ...BLANK_TALLY, numerator: 0 });
    expect(applyTallyChange(lost, { denominator: 9 }, false)).toEqual({ ...BLANK_TALLY, denominator: 9 });
    expect(applyTallyChange(lost, { awaited: "pharmacy" }, false)).toEqual({
      ...BLANK_TALLY,
      awaited: "pharmacy",
    });
    expect(applyTallyChange(lost, { note: "Asked" }, false)).toEqual({ ...lost, note: "Asked" });
  });

  it("lets awaited and the denominator take each other's place", () => {
    expect(applyTallyChange(counted, { awaited: "pharmacy" }, false)).toMatchObject({
      numerator: 4,
      denominator: null,
      awaited: "pharmacy",
    });
    expect(applyTallyChange(awaiting, { denominator: 90 }, false)).toMatchObject({
      denominator: 90,
      awaited: null,
    });
    expect(applyTallyChange(awaiting, { awaited: null }, false)).toMatchObject({
      awaited: null,
      denominator: null,
    });
  });

  it("leaves a shared denominator alone where one line speaks of itself", () => {
    const shared = { ...counted, awaited: null };
    expect(applyTallyChange(shared, { notCollected: "Lost" }, true)).toMatchObject({
      numerator: null,
      denominator: 100,
    });
    const silent = { ...lost, denominator: 100 };
    expect(applyTallyChange(silent, { denominator: 110 }, true)).toEqual({ ...lost, denominator: 110 });
    expect(applyTallyChange(silent, { notCollected: "Lost", denominator: 110 }, true)).toMatchObject({
      denominator: 110,
    });
  });

  it("refuses what contradicts itself", () => {
    expect(refusedPath({ notCollected: "Lost", numerator: 0 })).toBe("notCollected");
    expect(refusedPath({ notCollected: "Lost", denominator: 0 })).toBe("notCollected");
    expect(refusedPath({ notCollected: "Lost", awaited: "pharmacy" })).toBe("notCollected");
    expect(refusedPath({ notCollected: "Lost", numerator: 1 }, true)).toBe("notCollected");
    expect(refusedPath({ awaited: "pharmacy", denominator: 5 })).toBe("awaited");
    expect(refusedPath({ notCollected: "Lost", numerator: null, denominator: null })).toBeUndefined();
  });

  it("doesn't touch what it is given", () => {
    const before = { ...counted };
    applyTallyChange(counted, { numerator: 9 }, false);
    expect(counted).toEqual(before);
  });
});

describe("differingFields", () => {
  it("names them", () => {
    expect(differingFields(counted, { ...counted, numerator: 5, note: null })).toEqual(["numerator", "note"]);
    expect(differingFields(counted, { ...counted })).toEqual([]);
  });
});
