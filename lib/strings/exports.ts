import { cautionWords } from "./cautions";

/** The cautions as lines of a sheet. */
export const cautionLines: readonly string[] = [
  cautionWords.lead,
  cautionWords.urgent,
  cautionWords.countsOnly,
  ...cautionWords.points.map(({ title, text }) => `${title} ${text}`),
];

/** Words in the workbooks that are handed out. */
export const exportWords = {
  definitionColumns: [
    { title: "Indicator", width: 18 },
    { title: "Name", width: 28 },
    { title: "Version", width: 9 },
    { title: "From", width: 10 },
    { title: "Counted", width: 36 },
    { title: "Out of", width: 36 },
    { title: "Which ward an event belongs to", width: 40 },
    { title: "Kind", width: 16 },
    { title: "Per", width: 9 },
    { title: "Better when", width: 13 },
    { title: "Team", width: 18 },
    { title: "Shared denominator", width: 20 },
    { title: "With the version before", width: 24 },
  ],
  kinds: { proportion: "part of a whole", rate: "rate" },
  directions: { lower: "lower", higher: "higher", neither: "neither" },
  comparable: "comparable",
  notComparable: "not comparable",
} as const;
