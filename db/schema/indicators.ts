import { sql } from "drizzle-orm";
import {
  boolean,
  check,
  doublePrecision,
  integer,
  jsonb,
  pgTable,
  text,
  unique,
  uuid,
} from "drizzle-orm/pg-core";
import {
  countedBy,
  directions,
  kinds,
  limitChoices,
  teams,
  type CountedBy,
  type Direction,
  type Kind,
  type LimitChoice,
  type Team,
  type WatchedRule,
} from "@/lib/indicators/vocabulary";
import { isCode, isMonthText, isOneOf } from "./checks";
import { idColumn, instant, monthColumn } from "./columns";

/** What several indicators of a ward count out of; one value per ward and month. */
export const sharedDenominators = pgTable(
  "shared_denominators",
  {
    id: idColumn(),
    code: text("code").notNull(),
    label: text("label").notNull(),
  },
  (table) => [
    unique("shared_denominators_code_unique").on(table.code),
    check("shared_denominators_code", isCode(table.code)),
  ],
);

export const indicators = pgTable(
  "indicators",
  {
    id: idColumn(),
    code: text("code").notNull(),
    name: text("name").notNull(),
    kind: text("kind").$type<Kind>().notNull(),
    /** Rates are shown per this many denominator units: 100 is percent. */
    per: integer("per").notNull(),
    betterWhen: text("better_when").$type<Direction>().notNull(),
    team: text("team").$type<Team>().notNull(),
    numeratorBy: text("numerator_by").$type<CountedBy>().notNull().default("ward"),
    matureAfterDays: integer("mature_after_days").notNull().default(0),
    sharedDenominatorId: uuid("shared_denominator_id").references(() => sharedDenominators.id),
    limits: text("limits").$type<LimitChoice>().notNull().default("auto"),
    rules: jsonb("rules").$type<{ name: WatchedRule; length?: number }[]>().notNull(),
    /** A level that the hospital aims for, as a fraction of 1. */
    target: doublePrecision("target"),
    version: integer("version").notNull().default(1),
  },
  (table) => [
    unique("indicators_code_unique").on(table.code),
    check("indicators_code", isCode(table.code)),
    check("indicators_kind", isOneOf(table.kind, kinds)),
    check("indicators_better_when", isOneOf(table.betterWhen, directions)),
    check("indicators_team", isOneOf(table.team, teams)),
    check("indicators_numerator_by", isOneOf(table.numeratorBy, countedBy)),
    check("indicators_limits", isOneOf(table.limits, limitChoices)),
    check("indicators_per", sql`${table.per} > 0`),
    check("indicators_mature", sql`${table.matureAfterDays} between 0 and 366`),
    check("indicators_target", sql`${table.target} is null or ${table.target} >= 0`),
  ],
);

/** Versions of what is counted out of what; old months keep the one that they were counted under. */
export const indicatorDefinitions = pgTable(
  "indicator_definitions",
  {
    id: idColumn(),
    indicatorId: uuid("indicator_id")
      .notNull()
      .references(() => indicators.id),
    number: integer("number").notNull(),
    effectiveFrom: monthColumn("effective_from").notNull(),
    numeratorLabel: text("numerator_label").notNull(),
    denominatorLabel: text("denominator_label").notNull(),
    /** To which ward an event belongs, in words. */
    attribution: text("attribution").notNull().default(""),
    /** False ends runs and begins new trial limits; nothing is summed or compared across it. */
    comparable: boolean("comparable").notNull(),
    reason: text("reason").notNull(),
    decidedBy: text("decided_by").notNull(),
    decidedAt: instant("decided_at").notNull(),
  },
  (table) => [
    unique("indicator_definitions_number").on(table.indicatorId, table.number),
    unique("indicator_definitions_effective").on(table.indicatorId, table.effectiveFrom),
    check("indicator_definitions_month", isMonthText(table.effectiveFrom)),
    check("indicator_definitions_number_positive", sql`${table.number} > 0`),
  ],
);
