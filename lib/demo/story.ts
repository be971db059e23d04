/** The few things that happened at Harrowmere, told by how many months back from the last month. */
export const story = {
  /** Teasel was closed for new floors. */
  refurbishment: { ward: "TEASEL", from: 16, to: 14 },
  /** A sickness went round on Alder. */
  outbreak: { ward: "ALDER", indicator: "GUT-INF", back: 8 },
  /** Hand hygiene on Osier after coaching at the bedside. */
  improvement: { ward: "OSIER", indicator: "HANDS", from: 17 },
  /** Ten planned returns for dressings were counted as readmissions. */
  miscount: { ward: "OSIER", indicator: "READMIT", back: 5, tooMany: 16 },
  /** Alder was closed to transfers in a sickness that is over: left out of the baseline. */
  leftOut: { ward: "ALDER", indicator: "READMIT", back: 22 },
  /** Sedge never sent this month's return. */
  missing: { ward: "SEDGE", back: 9 },
  /** Tern sent this one ten days late. */
  late: { ward: "TERN", back: 7 },
  /** Late observations on Heron have crept up since the new rota. */
  creep: { ward: "HERON", indicator: "OBS-LATE", from: 8 },
  /** Not sent yet: Osier has begun, Curlew has not. */
  begun: "OSIER",
  notBegun: "CURLEW",
  /** Linnet didn't look at hands in this month. */
  notCollected: { ward: "LINNET", indicator: "HANDS", back: 6 },
} as const;

/** Years are told in months back: the first month of the demo lies this far back. */
export const FIRST_BACK = 35;
/** The last months are entered by the wards themselves; older ones came in by workbook, month by month. */
export const ENTERED_BY_HAND = 3;

export function refurbished(ward: string, back: number): boolean {
  const { ward: closed, from, to } = story.refurbishment;
  return ward === closed && back <= from && back >= to;
}

/** How much likelier events were in a month because of the story. */
export function rateFactor(ward: string, indicator: string, back: number): number {
  const { outbreak, improvement, creep, leftOut } = story;
  if (ward === leftOut.ward && indicator === leftOut.indicator && back === leftOut.back) return 2.1;
  if (ward === outbreak.ward && indicator === outbreak.indicator && back === outbreak.back) return 14;
  if (ward === improvement.ward && indicator === improvement.indicator && back <= improvement.from)
    return 0.52;
  if (ward === creep.ward && indicator === creep.indicator && back <= creep.from) return 1.13;
  return 1;
}
