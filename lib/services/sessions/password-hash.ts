import "server-only";
import { hash, verify } from "@node-rs/argon2";

/** argon2id (the package's default kind): 19 MiB, two passes, one lane. */
const COST = { memoryCost: 19_456, timeCost: 2, parallelism: 1 };

/** Nobody's: of random bytes that weren't kept. Compared against where an address is unknown. */
export const NOBODYS_HASH =
  "$argon2id$v=19$m=19456,t=2,p=1$G5Ba85qwnWJVihEuZ4ClXA$eRi/prkpM4EGFBkaJhS2PswMBfk+ZKQZX0G07QyPToU";

/** One way to write a text: keyboards differ in how they send composed characters. */
const canonical = (password: string) => password.normalize("NFKC");

/** Slow on purpose: never call it inside a transaction. */
export function hashPassword(password: string): Promise<string> {
  return hash(canonical(password), COST);
}

/** Slow on purpose: never call it inside a transaction. */
export function isPassword(password: string, encodedHash: string): Promise<boolean> {
  return verify(encodedHash, canonical(password));
}
