import type { SignInResponse } from "next-auth/react";
import { signInWords } from "@/lib/strings/sign-in";

const TOO_MANY_TRIES = /^TooManyTries-(\d+)$/;

/** Words for what the library's client says of a refused sign-in; null where no answer came at all. */
export function refusalWords(answer: SignInResponse | null | undefined): string {
  if (!answer) return signInWords.notReached;
  const wait = TOO_MANY_TRIES.exec(answer.error ?? "")?.[1];
  if (wait) return signInWords.wait(Math.ceil(Number(wait) / 60));
  return answer.error === "CredentialsSignin" ? signInWords.wrong : signInWords.broken;
}
