import { isDomainError } from "@/lib/errors";
import { createAnnotation } from "@/lib/services/annotations";
import { decideBaseline, setBaseline } from "@/lib/services/baselines";
import { correctTally, decideCorrection } from "@/lib/services/corrections";
import { getTallyHistory } from "@/lib/services/tallies";
import { talliesOf } from "./figures";
import { demoIndicators, demoWards, reports } from "./hospital";
import type { Cast } from "./people";
import type { Stage } from "./stage";
import { FIRST_BACK, story } from "./story";

/** Wards that are still on trial limits: two years of counts, no baseline set. */
const ON_TRIAL = new Set(["WILLOW", "DUNLIN", "PLOVER"]);
const BASELINE_END = 12;

/** After two years the lead set the first baselines. */
export async function setFirstBaselines(stage: Stage, cast: Cast): Promise<void> {
  const ctx = stage.ctx(cast.lead, stage.after(BASELINE_END - 1, 20, 11));
  for (const ward of demoWards.filter((each) => !ON_TRIAL.has(each.code))) {
    for (const indicator of demoIndicators.filter((each) => reports(each, ward))) {
      const { improvement, leftOut } = story;
      const isImproved = ward.code === improvement.ward && indicator.code === improvement.indicator;
      const isLeftOut = ward.code === leftOut.ward && indicator.code === leftOut.indicator;
      const reason = "Closed to transfers during a sickness that is over; it won't recur.";
      const input = {
        ward: ward.code,
        indicator: indicator.code,
        from: stage.month(FIRST_BACK),
        to: stage.month(isImproved ? improvement.from + 1 : BASELINE_END),
        leftOut: isLeftOut ? [{ month: stage.month(leftOut.back), reason }] : [],
        appliesFrom: null,
        reason: "The first two years, without changes that we know of.",
      };
      await setBaseline({ ctx, input }).catch(unlessNothingCounted);
    }
  }
}

/** A line with no event in two years has no limits to set. */
function unlessNothingCounted(error: unknown): void {
  if (!isDomainError(error, "invalid")) throw error;
}

/** Coaching worked: infection control proposes a new baseline, the lead decides. */
export async function changeBaseline(stage: Stage, cast: Cast): Promise<void> {
  const { ward, indicator, from } = story.improvement;
  const proposed = await setBaseline({
    ctx: stage.ctx(cast.infection, stage.after(5, 12, 10)),
    input: {
      ward,
      indicator,
      from: stage.month(from),
      to: stage.month(6),
      leftOut: [],
      appliesFrom: stage.month(from),
      reason: "Coaching at the bedside since then; understood, and expected to last.",
    },
  });
  await decideBaseline({
    ctx: stage.ctx(cast.lead, stage.after(5, 19, 10)),
    input: { ward, indicator, id: proposed.id, agree: true, reason: null, version: proposed.version },
  });
}

/** The nurse found the miscount; the lead agreed. */
export async function correctMiscount(stage: Stage, cast: Cast): Promise<void> {
  const { ward, indicator, back } = story.miscount;
  const month = stage.month(back);
  const right = talliesOf({ month, back }).find(
    (tally) => tally.ward === ward && tally.indicator === indicator,
  );
  if (!right) throw new Error("The demo has no miscount to correct.");
  const asked = stage.ctx(cast.nurseOf(ward), stage.after(back - 1, 8, 14));
  const { tally } = await getTallyHistory({ ctx: asked, input: { ward, month, indicator } });
  const correction = await correctTally({
    ctx: asked,
    input: {
      ward,
      month,
      indicator,
      numerator: right.numerator,
      reason: "Planned returns for dressings had been counted as readmissions.",
      version: tally.version,
    },
  });
  const decided = stage.ctx(cast.lead, stage.after(back - 1, 9, 9));
  await decideCorrection({ ctx: decided, input: { id: correction.id, agree: true } });
}

export async function writeNotes(stage: Stage, cast: Cast): Promise<void> {
  const { improvement, outbreak, refurbishment, creep } = story;
  const notes = [
    { ...improvement, back: improvement.from, text: "Coaching starts" },
    { ...outbreak, text: "Sickness on two bays" },
    { ward: refurbishment.ward, indicator: "FALLS", back: refurbishment.from, text: "Closed for new floors" },
    { ...creep, back: creep.from, text: "New rota" },
  ];
  for (const { ward, indicator, back, text } of notes) {
    const ctx = stage.ctx(cast.infection, stage.after(back, 10, 12));
    await createAnnotation({ ctx, input: { ward, indicator, month: stage.month(back), text } });
  }
}
