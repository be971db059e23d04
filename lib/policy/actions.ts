import type { Role } from "./roles";

/**
 * Who may attempt what, by role alone. `yes` still has to pass the predicates on the record's facts (own ward,
 * own team, authorship). Where a role is missing it may not; there is no default that allows.
 */
type Answer = Partial<Record<Role, true>>;

const lead: Answer = { quality_lead: true };
const controlAndLead: Answer = { infection_control: true, quality_lead: true };
const staff: Answer = { ward_nurse: true, infection_control: true, quality_lead: true };
const wardAndLead: Answer = { ward_nurse: true, quality_lead: true };
const everyone: Answer = { ...staff, board_member: true };
/** Commands and the ticker alone, as a system actor. */
const nobody: Answer = {};

export const actionTable = {
  "me.read": everyone,
  "session.end": everyone,
  "ward.list": staff,
  "ward.create": lead,
  "ward.update": lead,
  "indicator.list": staff,
  "indicator.create": lead,
  "indicator.update": lead,
  "assignment.list": staff,
  "assignment.set": lead,
  "baseline.read": staff,
  "baseline.set": lead,
  "baseline.propose": controlAndLead,
  "baseline.decide": lead,
  "return.read": staff,
  "return.submit": wardAndLead,
  "return.recall": wardAndLead,
  "return.accept": lead,
  "return.reopen": lead,
  "tally.save": staff,
  "tally.correct": wardAndLead,
  "correction.decide": lead,
  "tally.history": staff,
  "chart.read": staff,
  "annotation.create": staff,
  "signal.list": staff,
  "series.rebuild": nobody,
  "import.create": wardAndLead,
  "import.read": wardAndLead,
  "import.commit": wardAndLead,
  "import.accept": lead,
  "import.take-back": wardAndLead,
  "export.tallies": staff,
  "pack.list": everyone,
  "people.list": lead,
  "people.invite": lead,
  "people.update": lead,
  "settings.read": staff,
  "settings.update": lead,
  "audit.read": lead,
} as const satisfies Record<string, Answer>;

export type Action = keyof typeof actionTable;

export const actions = Object.keys(actionTable) as Action[];
