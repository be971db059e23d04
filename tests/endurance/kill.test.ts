import { expect, it } from "vitest";
import { killRounds } from "@/tests/support/kill-rounds";
import { START_LIMIT } from "@/tests/support/server";

it(
  "loses nothing that it said was saved, in ten kills",
  async () => {
    expect(await killRounds(10)).toBeGreaterThan(500);
  },
  3 * START_LIMIT,
);
