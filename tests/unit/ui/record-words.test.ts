import { describe, expect, it } from "vitest";
import {
  differencesOf,
  subjectInWords,
  valueInWords,
} from "@/app/(signed-in)/set-up/record/_components/differences";
import { auditActions } from "@/lib/services/audit/audit-actions";
import { actionWords } from "@/lib/strings/record";

describe("the record of changes in words", () => {
  it("has words for every action, and for nothing else", () => {
    expect(Object.keys(actionWords).sort()).toEqual([...auditActions].sort());
  });

  it("lists the fields in which two records differ", () => {
    const before = { name: "Osier", openTo: null, rules: [{ name: "trend" }], gone: 1 };
    const after = { name: "Osier", openTo: "2026-12", rules: [{ name: "trend", length: 7 }] };
    expect(differencesOf(before, after)).toEqual([
      { field: "openTo", before: null, after: "2026-12" },
      { field: "rules", before: [{ name: "trend" }], after: [{ name: "trend", length: 7 }] },
      { field: "gone", before: 1, after: undefined },
    ]);
    expect(differencesOf(null, { code: "A" })).toEqual([{ field: "code", before: undefined, after: "A" }]);
    expect(differencesOf(null, null)).toEqual([]);
    expect(differencesOf("altered by hand", null)).toEqual([
      { field: "value", before: "altered by hand", after: undefined },
    ]);
  });

  it("names a record by what people call it", () => {
    const entry = {
      subjectType: "ward",
      before: { name: "Old", code: "A" },
      after: { name: "New", code: "A" },
    };
    expect(subjectInWords(entry)).toBe("New, A");
    expect(subjectInWords({ before: null, after: null })).toBeNull();
  });

  it("writes a value in one line", () => {
    expect(valueInWords("text")).toBe("text");
    expect(valueInWords(0)).toBe("0");
    expect(valueInWords([1, 2])).toBe("[1,2]");
    expect(valueInWords("")).toBeNull();
    expect(valueInWords(null)).toBeNull();
  });
});
