import { lastDayOf, type Month } from "@/lib/indicators/month";
import { chanceFor, type Chance } from "./chance";
import { demoIndicators, demoWards, reports, type DemoIndicator, type DemoWard } from "./hospital";
import { rateFactor, refurbished } from "./story";

export interface DemoTally {
  ward: string;
  indicator: string;
  month: Month;
  numerator: number;
  denominator: number;
}

/** Months of the demo, oldest first, by how many months back from the last one they lie. */
export interface DemoMonth {
  month: Month;
  /** 0 for the last month, 35 for the first. */
  back: number;
}

/** All invented tallies of one month, ward by ward. Depends on the position of the month alone, not on the date. */
export function talliesOf({ month, back }: DemoMonth): DemoTally[] {
  return demoWards.flatMap((ward) =>
    demoIndicators
      .filter((indicator) => reports(indicator, ward))
      .map((indicator) => tallyOf(ward, indicator, month, back)),
  );
}

function tallyOf(ward: DemoWard, indicator: DemoIndicator, month: Month, back: number): DemoTally {
  const key = { ward: ward.code, indicator: indicator.code, month };
  if (refurbished(ward.code, back)) return { ...key, numerator: 0, denominator: 0 };
  const chance = chanceFor(`${ward.code} ${indicator.code} ${back}`);
  const denominator = denominatorOf(ward, indicator, month, back);
  const wardFactor = 0.8 + 0.4 * chanceFor(`${ward.code} ${indicator.code}`).next();
  const unrest = 1 + (indicator.unrest ?? 0) * (2 * chance.next() - 1) * 1.7;
  const rate =
    indicator.rate * wardly(indicator, wardFactor) * unrest * rateFactor(ward.code, indicator.code, back);
  const numerator =
    indicator.kind === "proportion"
      ? chance.binomial(denominator, Math.min(0.985, rate))
      : chance.poisson(rate * denominator);
  return { ...key, numerator, denominator };
}

/** Wards differ, but a share near one can't differ by much. */
function wardly(indicator: DemoIndicator, factor: number): number {
  return indicator.betterWhen === "higher" ? 1 + (factor - 1) * 0.2 : factor;
}

function denominatorOf(ward: DemoWard, indicator: DemoIndicator, month: Month, back: number): number {
  // Bed days are drawn from one stream a ward, so that lines which share them agree.
  const exposure = indicator.exposure;
  switch (exposure.of) {
    case "bed-days":
      return bedDays(ward, month, back);
    case "share-of-bed-days":
      return Math.round(
        bedDays(ward, month, back) * exposure.share * vary(chanceFor(`${ward.code} share ${back}`), 0.12),
      );
    case "discharges":
      return discharges(ward, back);
    case "share-of-discharges":
      return Math.round(discharges(ward, back) * exposure.share);
    case "observed":
      return Math.round(
        exposure.about * vary(chanceFor(`${ward.code} ${indicator.code} seen ${back}`), 0.35),
      );
  }
}

function bedDays(ward: DemoWard, month: Month, back: number): number {
  const days = Number(lastDayOf(month).slice(8));
  return Math.round(ward.beds * days * vary(chanceFor(`${ward.code} beds ${back}`), 0.1));
}

function discharges(ward: DemoWard, back: number): number {
  // In a few months many beds are closed: the channel opens wide, and the month can show little.
  const thin = chanceFor(`${ward.code} thin ${back}`).next() < 0.08 ? 0.42 : 1;
  return Math.max(3, Math.round(ward.discharges * thin * vary(chanceFor(`${ward.code} out ${back}`), 0.28)));
}

function vary(chance: Chance, share: number): number {
  return 1 + share * (chance.next() + chance.next() - 1);
}
