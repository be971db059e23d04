import { expect, it } from "vitest";
import { killRounds } from "@/tests/support/kill-rounds";
import { START_LIMIT } from "@/tests/support/server";

it(
  "loses nothing that it said was saved, in three kills",
  async () => {
    expect(await killRounds(3)).toBeGreaterThan(70);
  },
  START_LIMIT,
);
