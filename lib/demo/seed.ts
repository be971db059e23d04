import type { Db } from "@/db/client";
import { systemActor } from "@/lib/policy";
import { listWards } from "@/lib/services/wards";
import { enterMonth } from "./enter-month";
import { loadMonth } from "./load-history";
import { makePeople } from "./people";
import { setUpHarrowmere } from "./set-up";
import { makeStage } from "./stage";
import { ENTERED_BY_HAND, FIRST_BACK, story } from "./story";
import { changeBaseline, correctMiscount, setFirstBaselines, writeNotes } from "./tell-story";

/**
 * Fills an empty store with Harrowmere District Hospital: three years up to the last full month before `now`, told by
 * calls of the services at the instants when things happened. Does nothing where there are wards already.
 */
export async function seedDemo({ db, now }: { db: Db; now: Date }): Promise<void> {
  const stage = makeStage(db, now);
  const beginning = stage.after(FIRST_BACK + 1, 1, 8);
  const ctx = stage.ctx(systemActor("demo"), beginning);
  if ((await listWards({ ctx })).length > 0) return;

  await setUpHarrowmere(ctx, stage);
  const cast = await makePeople(ctx);
  for (let back = FIRST_BACK; back >= 0; back -= 1) {
    if (back >= ENTERED_BY_HAND) await loadMonth(stage, cast, back);
    else await enterMonth(stage, cast, back);
    if (back === 11) await setFirstBaselines(stage, cast);
    if (back === 5) await changeBaseline(stage, cast);
    if (back === story.miscount.back - 1) await correctMiscount(stage, cast);
  }
  await writeNotes(stage, cast);
}
