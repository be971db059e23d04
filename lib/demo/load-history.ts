import type { Ctx } from "@/db/transaction";
import { checkImport, commitImport } from "@/lib/services/imports";
import { acceptReturn, submitReturn } from "@/lib/services/returns";
import { writeTalliesCsv, type WrittenTally } from "@/lib/workbook";
import { enterTeamLines } from "./enter-month";
import type { Cast } from "./people";
import { talliesOf, type DemoTally } from "./figures";
import { demoWards } from "./hospital";
import type { Stage } from "./stage";
import { story } from "./story";

/** The sheet of one month as the lead brought it in on the 4th; a late ward sent its own lines days afterwards. */
export async function loadMonth(stage: Stage, cast: Cast, back: number): Promise<void> {
  const tallies = talliesOf({ month: stage.month(back), back }).filter((tally) => !isMissing(tally, back));
  const isLate = (tally: DemoTally) => tally.ward === story.late.ward && back === story.late.back;
  await bringIn(
    stage.ctx(cast.lead, stage.after(back, 4, 9)),
    tallies.filter((tally) => !isLate(tally)),
    back,
  );
  const late = tallies.filter(isLate);
  if (late.length > 0) await sendLate(stage, cast, late, back);
}

async function sendLate(stage: Stage, cast: Cast, late: readonly DemoTally[], back: number): Promise<void> {
  const ward = demoWards.find(({ code }) => code === story.late.ward);
  if (!ward) throw new Error("The demo has no late ward.");
  const input = { ward: ward.code, month: stage.month(back) };
  await enterTeamLines(stage, cast, ward, late, back);
  await bringIn(stage.ctx(cast.nurseOf(ward.code), stage.after(back, 17, 9)), late, back, false);
  await submitReturn({ ctx: stage.ctx(cast.nurseOf(ward.code), stage.after(back, 17, 10)), input });
  await acceptReturn({ ctx: stage.ctx(cast.lead, stage.after(back, 18, 9)), input });
}

async function bringIn(ctx: Ctx, tallies: readonly DemoTally[], back: number, accept = true): Promise<void> {
  const bytes = await writeTalliesCsv(tallies.map((tally) => asWritten(tally, back)));
  const month = tallies[0]?.month ?? "";
  const checked = await checkImport({
    ctx,
    input: { fileName: `harrowmere-${month}.csv`, bytes, isOwn: true },
  });
  await commitImport({ ctx, input: { id: checked.id, accept } });
}

function isMissing(tally: DemoTally, back: number): boolean {
  return tally.ward === story.missing.ward && back === story.missing.back;
}

/** As somebody wrote it down, miscount and all. */
function asWritten(tally: DemoTally, back: number): WrittenTally {
  const { miscount, notCollected } = story;
  const is = (told: { ward: string; indicator: string; back: number }) =>
    tally.ward === told.ward && tally.indicator === told.indicator && back === told.back;
  if (is(notCollected)) {
    const reason = "No observer was free this month.";
    return { ...tally, numerator: null, denominator: null, notCollected: reason, note: null };
  }
  const numerator = is(miscount) ? tally.numerator + miscount.tooMany : tally.numerator;
  return { ...tally, numerator, notCollected: null, note: null };
}
