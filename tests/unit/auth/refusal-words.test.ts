import { describe, expect, it } from "vitest";
import { refusalWords } from "@/app/(public)/sign-in/_components/refusal-words";
import { signInWords } from "@/lib/strings/sign-in";

const answer = (error: string) => ({ error, status: 401, ok: false, url: null });

describe("refusalWords", () => {
  it("says how long to wait, in whole minutes", () => {
    expect(refusalWords(answer("TooManyTries-30"))).toBe(signInWords.wait(1));
    expect(refusalWords(answer("TooManyTries-61"))).toBe(signInWords.wait(2));
  });

  it("tells a wrong password, a fault of ours and a lost connection apart", () => {
    const words = [
      refusalWords(answer("CredentialsSignin")),
      refusalWords(answer("Unexpected")),
      refusalWords(null),
    ];
    expect(words).toEqual([signInWords.wrong, signInWords.broken, signInWords.notReached]);
  });
});
