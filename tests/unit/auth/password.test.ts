import { describe, expect, it } from "vitest";
import { holdsEmailName, newPassword, passwordMessages } from "@/lib/schemas/password";
import { choosePasswordForm, signInSchema } from "@/lib/schemas/sign-in";

const messageFor = (password: string) => newPassword.safeParse(password).error?.issues[0]?.message;

describe("a new password", () => {
  it.each(["a tide falls slowly", "zzzzyyyyxxxx", "ebbline-demo", "Ω".repeat(11) + "é", " twelve chars"])(
    "takes %j: length counts, not what it is made of",
    (password) => expect(messageFor(password)).toBeUndefined(),
  );

  it("counts characters as people do", () => {
    expect(messageFor("eleven char")).toBe(passwordMessages.tooShort);
    // Six pairs of UTF-16 units are six characters.
    expect(messageFor("🌊🌊🌊🐟🐟🐟")).toBe(passwordMessages.tooShort);
    expect(messageFor("x".repeat(99) + "yz".repeat(51))).toBe(passwordMessages.tooLong);
  });

  it.each([
    "password1234",
    "Password12345",
    "123456789012",
    "QWERTYUIOP12",
    "aaaaaaaaaaaa",
    "abcabcabcabc",
    "passwordpassword!",
  ])("refuses %j, which is tried first", (password) =>
    expect(messageFor(password)).toBe(passwordMessages.common),
  );
});

describe("holdsEmailName", () => {
  it("finds the part before the @, whatever its case, and leaves very short ones alone", () => {
    expect(holdsEmailName("hello Maro.V 2026", "maro.v@example.test")).toBe(true);
    expect(holdsEmailName("hello there 2026", "maro.v@example.test")).toBe(false);
    expect(holdsEmailName("ally pally", "al@example.test")).toBe(false);
  });
});

describe("the form", () => {
  it("wants the password twice, without the address in it", () => {
    const form = choosePasswordForm("maro@example.test");
    const paths = (password: string, again: string) =>
      form.safeParse({ password, again }).error?.issues.map((issue) => issue.path.join("."));
    expect(paths("a tide falls slowly", "a tide falls slowly")).toBeUndefined();
    expect(paths("a tide falls slowly", "a tide falls fast")).toEqual(["again"]);
    expect(paths("my name is maro", "my name is maro")).toEqual(["password"]);
  });

  it("asks the first lead for name and email, and nobody else", () => {
    const password = { password: "a tide falls slowly", again: "a tide falls slowly" };
    expect(choosePasswordForm(null).safeParse({ ...password, email: "", name: "" }).success).toBe(false);
    expect(
      choosePasswordForm(null).parse({ ...password, email: " Maro@Example.test ", name: "Maro" }).email,
    ).toBe("maro@example.test");
    expect(
      choosePasswordForm("maro@example.test").safeParse({ ...password, email: "", name: "" }).success,
    ).toBe(true);
  });
});

describe("signing in", () => {
  it("folds the address and refuses a password that nobody types", () => {
    expect(signInSchema.parse({ email: " Maro@Example.TEST", password: "x" }).email).toBe(
      "maro@example.test",
    );
    expect(signInSchema.safeParse({ email: "maro@example.test", password: "x".repeat(1001) }).success).toBe(
      false,
    );
    expect(signInSchema.safeParse({ email: ["maro@example.test"], password: "x" }).success).toBe(false);
  });
});
