import { describe, expect, it } from "vitest";
import { count, optionalText, text } from "@/lib/schemas/common";

describe("text", () => {
  it.each([
    ["a control character", "a\u0000b"],
    ["half of a character", "a\ud800b"],
    ["a mark that turns the direction of writing", "a\u202eb"],
  ])("refuses %s", (_, value) => {
    expect(text(20).safeParse(value).success).toBe(false);
    expect(optionalText(20).safeParse(value).success).toBe(false);
  });

  it("takes line ends, tabs, accents and whole characters beyond the first plane, trimmed", () => {
    expect(text(40).parse("  Ward n\u00e9e\tof\n\u{1F331} ")).toBe("Ward n\u00e9e\tof\n\u{1F331}");
  });

  it("makes empty optional text null", () => {
    expect(optionalText(20).parse("  ")).toBeNull();
  });
});

describe("count", () => {
  it("keeps blank apart from zero and turns no text into a number", () => {
    expect(count.parse(null)).toBeNull();
    expect(count.parse(0)).toBe(0);
    for (const wrong of ["5", "", true, 1.5, -1, 2e9, Number.NaN, [1]]) {
      expect(count.safeParse(wrong).success).toBe(false);
    }
  });
});

describe("what the schemas say", () => {
  it("is never the library's own wording", () => {
    const messages = text(5)
      .safeParse(undefined)
      .error?.issues.map((issue) => issue.message);
    expect(messages).toEqual(["Fill this in."]);
    expect(count.safeParse("x").error?.issues[0]?.message).toBe("Give a whole number, or leave it blank.");
  });
});
