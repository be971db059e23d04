import type { Direction, LimitChoice, Team } from "@/lib/indicators/vocabulary";

/** Everything here is invented: hospital, wards, people, rates. */
export const hospitalName = "Harrowmere District Hospital";
export const timeZone = "Europe/London";

export interface DemoWard {
  code: string;
  name: string;
  division: string;
  /** Occupied beds on an ordinary day. */
  beds: number;
  /** Patients who leave alive in an ordinary month. */
  discharges: number;
}

const older = "Older people's medicine";
const acute = "Acute medicine";
const surgery = "Surgery";
const critical = "Critical care";
const family = "Women and children";

export const demoWards: readonly DemoWard[] = [
  { code: "OSIER", name: "Osier ward", division: older, beds: 25, discharges: 120 },
  { code: "TERN", name: "Tern ward", division: older, beds: 22, discharges: 104 },
  { code: "SEDGE", name: "Sedge ward", division: older, beds: 19, discharges: 61 },
  { code: "ALDER", name: "Alder ward", division: acute, beds: 27, discharges: 188 },
  { code: "HERON", name: "Heron ward", division: acute, beds: 24, discharges: 176 },
  { code: "LINNET", name: "Linnet ward", division: acute, beds: 21, discharges: 142 },
  { code: "ROWAN", name: "Rowan ward", division: acute, beds: 18, discharges: 97 },
  { code: "BRACKEN", name: "Bracken ward", division: surgery, beds: 23, discharges: 205 },
  { code: "CURLEW", name: "Curlew ward", division: surgery, beds: 20, discharges: 160 },
  { code: "TEASEL", name: "Teasel ward", division: surgery, beds: 16, discharges: 118 },
  { code: "MALLOW", name: "Mallow unit", division: critical, beds: 9, discharges: 22 },
  { code: "PLOVER", name: "Plover unit", division: critical, beds: 7, discharges: 14 },
  { code: "WILLOW", name: "Willow ward", division: family, beds: 14, discharges: 166 },
  { code: "DUNLIN", name: "Dunlin ward", division: family, beds: 6, discharges: 27 },
];

/** What an indicator's denominator is made of, for inventing one. */
export type Exposure =
  | { of: "bed-days" }
  | { of: "discharges" }
  | { of: "share-of-bed-days"; share: number }
  | { of: "share-of-discharges"; share: number }
  | { of: "observed"; about: number };

export interface DemoIndicator {
  code: string;
  name: string;
  numeratorLabel: string;
  denominatorLabel: string;
  kind: "proportion" | "rate";
  per: number;
  betterWhen: Direction;
  team: Team;
  numeratorBy?: "ward" | "team";
  sharedDenominator?: string;
  matureAfterDays?: number;
  limits?: LimitChoice;
  target?: number;
  attribution: string;
  exposure: Exposure;
  /** Events per denominator unit in an ordinary ward. */
  rate: number;
  /** Spread of the rate from month to month beyond chance, as a share of it. */
  unrest?: number;
  /** Wards that report it; all where left out. */
  wards?: readonly string[];
}

const bedDays = "Occupied bed days";
const wards = (text: string) => text.split(" ");

export const demoIndicators: readonly DemoIndicator[] = [
  {
    code: "FALLS",
    name: "Falls",
    numeratorLabel: "Falls",
    denominatorLabel: bedDays,
    kind: "rate",
    per: 1000,
    betterWhen: "lower",
    team: "quality",
    sharedDenominator: "OBD",
    attribution: "The ward on which the patient fell.",
    exposure: { of: "bed-days" },
    rate: 0.0052,
  },
  {
    code: "FALLS-HARM",
    name: "Falls with harm",
    numeratorLabel: "Falls with harm",
    denominatorLabel: bedDays,
    kind: "rate",
    per: 1000,
    betterWhen: "lower",
    team: "quality",
    sharedDenominator: "OBD",
    attribution: "The ward on which the patient fell.",
    exposure: { of: "bed-days" },
    rate: 0.0011,
  },
  {
    code: "ULCERS",
    name: "Pressure ulcers",
    numeratorLabel: "New ulcers found",
    denominatorLabel: bedDays,
    kind: "rate",
    per: 1000,
    betterWhen: "lower",
    team: "quality",
    sharedDenominator: "OBD",
    attribution: "The ward on which the ulcer was first seen.",
    exposure: { of: "bed-days" },
    rate: 0.0031,
  },
  {
    code: "READMIT",
    name: "Unplanned readmissions within 30 days",
    numeratorLabel: "Readmitted within 30 days",
    denominatorLabel: "Discharges",
    kind: "proportion",
    per: 100,
    betterWhen: "lower",
    team: "quality",
    matureAfterDays: 30,
    target: 0.07,
    attribution: "The ward from which the patient was discharged.",
    exposure: { of: "discharges" },
    rate: 0.095,
    wards: wards("OSIER TERN SEDGE ALDER HERON LINNET ROWAN BRACKEN CURLEW TEASEL DUNLIN"),
  },
  {
    code: "DOSES",
    name: "Doses omitted",
    numeratorLabel: "Omitted, no reason",
    denominatorLabel: "Doses due",
    kind: "proportion",
    per: 100,
    betterWhen: "lower",
    team: "quality",
    limits: "overdispersed",
    attribution: "The ward that held the drug chart.",
    exposure: { of: "observed", about: 3400 },
    rate: 0.031,
    unrest: 0.16,
    wards: wards("OSIER TERN SEDGE ALDER HERON LINNET ROWAN BRACKEN CURLEW TEASEL"),
  },
  {
    code: "OBS-LATE",
    name: "Late observations",
    numeratorLabel: "Sets taken late",
    denominatorLabel: "Sets due",
    kind: "proportion",
    per: 100,
    betterWhen: "lower",
    team: "quality",
    attribution: "The ward that owed the observations.",
    exposure: { of: "observed", about: 1750 },
    rate: 0.092,
    unrest: 0.03,
    wards: wards("OSIER TERN SEDGE ALDER HERON LINNET ROWAN BRACKEN CURLEW TEASEL WILLOW"),
  },
  {
    code: "HANDS",
    name: "Hand hygiene missed",
    numeratorLabel: "Moments missed",
    denominatorLabel: "Moments seen",
    kind: "proportion",
    per: 100,
    betterWhen: "lower",
    team: "infection_control",
    attribution: "The ward on which the moment was seen.",
    exposure: { of: "observed", about: 130 },
    rate: 0.17,
  },
  {
    code: "CATH-INF",
    name: "Catheter infections",
    numeratorLabel: "Infections",
    denominatorLabel: "Catheter days",
    kind: "rate",
    per: 1000,
    betterWhen: "lower",
    team: "infection_control",
    numeratorBy: "team",
    attribution: "The ward on which the catheter had been for two days.",
    exposure: { of: "share-of-bed-days", share: 0.34 },
    rate: 0.0039,
    wards: wards("OSIER TERN SEDGE ALDER HERON BRACKEN CURLEW MALLOW"),
  },
  {
    code: "LINE-INF",
    name: "Central line infections",
    numeratorLabel: "Infections",
    denominatorLabel: "Central line days",
    kind: "rate",
    per: 1000,
    betterWhen: "lower",
    team: "infection_control",
    numeratorBy: "team",
    attribution: "The unit on which the line had been for two days.",
    exposure: { of: "share-of-bed-days", share: 0.55 },
    rate: 0.0021,
    wards: wards("MALLOW PLOVER"),
  },
  {
    code: "GUT-INF",
    name: "Gut infections after admission",
    numeratorLabel: "Infections",
    denominatorLabel: bedDays,
    kind: "rate",
    per: 10_000,
    betterWhen: "lower",
    team: "infection_control",
    sharedDenominator: "OBD",
    attribution: "The ward on which the patient was on the third day.",
    exposure: { of: "bed-days" },
    rate: 0.0009,
    wards: wards("OSIER TERN SEDGE ALDER HERON LINNET ROWAN BRACKEN CURLEW TEASEL"),
  },
  {
    code: "CLOT-RISK",
    name: "Clot risk assessed",
    numeratorLabel: "Assessed within a day",
    denominatorLabel: "Admissions checked",
    kind: "proportion",
    per: 100,
    betterWhen: "higher",
    team: "quality",
    target: 0.95,
    attribution: "The ward to which the patient was admitted.",
    exposure: { of: "share-of-discharges", share: 0.9 },
    rate: 0.92,
    wards: wards("OSIER TERN ALDER HERON LINNET ROWAN BRACKEN CURLEW TEASEL MALLOW DUNLIN"),
  },
  {
    code: "PAIN",
    name: "Pain looked at within an hour",
    numeratorLabel: "Looked at within an hour",
    denominatorLabel: "Patients asked",
    kind: "proportion",
    per: 100,
    betterWhen: "higher",
    team: "quality",
    attribution: "The ward on which the patient was asked.",
    exposure: { of: "observed", about: 18 },
    rate: 0.8,
    wards: wards("BRACKEN CURLEW TEASEL WILLOW DUNLIN"),
  },
];

export function reports(indicator: DemoIndicator, ward: DemoWard): boolean {
  return indicator.wards === undefined || indicator.wards.includes(ward.code);
}
