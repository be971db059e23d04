import type { DemoAccount } from "./http-client";

type PageList = [name: string, path: string][];

const open: PageList = [
  ["sign-in", "/sign-in"],
  ["cautions", "/cautions"],
  ["how-computed", "/how-computed"],
  ["unknown-page", "/no-such-page"],
];

/** On the day of the tests' clock the last month is November 2026. */
const nurse: PageList = [
  ["my-page", "/"],
  ["returns", "/returns"],
  ["return-open", "/returns/OSIER/2026-11"],
  ["return-sent", "/returns/TERN/2026-11"],
  ["return-accepted", "/returns/OSIER/2026-10"],
  ["tally-history", "/returns/OSIER/2026-06/READMIT"],
  ["charts", "/charts"],
  ["chart-readmissions", "/charts/OSIER/READMIT"],
  ["chart-falls", "/charts/OSIER/FALLS"],
  ["chart-hands", "/charts/OSIER/HANDS"],
  ["signals", "/signals"],
  ["imports", "/imports"],
];

const infection: PageList = [
  ["my-page", "/"],
  ["returns", "/returns"],
  ["charts", "/charts"],
  ["chart-outbreak", "/charts/ALDER/GUT-INF"],
  ["chart-small", "/charts/PLOVER/LINE-INF"],
  ["baseline", "/charts/OSIER/HANDS/baseline"],
  ["signals", "/signals"],
];

const lead: PageList = [
  ["my-page", "/"],
  ["returns", "/returns"],
  ["return-to-accept", "/returns/DUNLIN/2026-11"],
  ["chart-doses", "/charts/HERON/DOSES"],
  ["chart-refurbished", "/charts/TEASEL/FALLS"],
  ["chart-assessed", "/charts/ROWAN/CLOT-RISK"],
  ["chart-quarters", "/charts/DUNLIN/PAIN?by=quarter"],
  ["signals", "/signals"],
  ["imports", "/imports"],
  ["people", "/people"],
  ["set-up", "/set-up"],
  ["wards", "/set-up/wards"],
  ["ward", "/set-up/wards/OSIER"],
  ["ward-new", "/set-up/wards/new"],
  ["indicators", "/set-up/indicators"],
  ["indicator", "/set-up/indicators/HANDS"],
  ["indicator-new", "/set-up/indicators/new"],
  ["assignments", "/set-up/assignments"],
  ["hospital", "/set-up/hospital"],
  ["record", "/set-up/record"],
];

const board: PageList = [
  ["packs", "/packs"],
  ["refused", "/charts"],
];

/** The pages that an account is meant to use, and one that it is refused; null for whoever hasn't signed in. */
export function pagesFor(account: DemoAccount | null): PageList {
  switch (account) {
    case null:
      return open;
    case "nurse":
    case "nurse2":
      return nurse;
    case "infection":
      return infection;
    case "lead":
      return lead;
    case "board":
      return board;
  }
}
