import { describe, expect, it } from "vitest";
import { editDistance, nearestNamed } from "@/lib/indicators/import-nearest";

const entries = [
  { code: "FALLS", name: "Falls" },
  { code: "PU", name: "Pressure ulcers" },
  { code: "HAND-HYG", name: "Hand hygiene missed" },
];
const nearest = (text: string) => nearestNamed(text, entries)?.code ?? null;

describe("editDistance", () => {
  it("counts insertions, deletions, replacements and swaps of neighbours", () => {
    expect(editDistance("tern", "tern")).toBe(0);
    expect(editDistance("tern", "terns")).toBe(1);
    expect(editDistance("osier", "osir")).toBe(1);
    expect(editDistance("osier", "osser")).toBe(1);
    expect(editDistance("osier", "oseir")).toBe(1);
    expect(editDistance("", "abc")).toBe(3);
    expect(editDistance("abc", "")).toBe(3);
  });
});

describe("nearestNamed", () => {
  it("finds a code or name with a slip in it, and a name written out", () => {
    expect(nearest("FALS")).toBe("FALLS");
    expect(nearest("pressure ulcer")).toBe("PU");
    expect(nearest("Pressure Ulcers")).toBe("PU");
    expect(nearest("hand_hyg")).toBe("HAND-HYG");
  });

  it("suggests nothing far away, for nothing, or out of nothing", () => {
    expect(nearest("Readmissions")).toBeNull();
    expect(nearest("  ")).toBeNull();
    expect(nearestNamed("FALLS", [])).toBeNull();
  });

  it("takes the first of two that are equally near", () => {
    const twins = [
      { code: "WARD-1", name: "" },
      { code: "WARD-2", name: "" },
    ];
    expect(nearestNamed("WARD-3", twins)?.code).toBe("WARD-1");
  });
});
