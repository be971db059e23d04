import { DomainError } from "@/lib/errors";
import type { Team } from "@/lib/indicators/vocabulary";
import type { Actor, PersonActor } from "./actor";
import { actionTable, type Action } from "./actions";

/**
 * Facts about a record that a decision may need. An action that needs a fact refuses when it is missing, so a
 * forgotten look-up closes a door instead of opening one.
 */
export interface Facts {
  wardId?: string;
  /** Owning team of the indicator concerned. */
  team?: Team;
  /** Who counts this line's numerator. */
  numeratorBy?: "ward" | "team";
  /** Person who made the record (uploader, proposer, author). */
  authorId?: string | null;
}

export type Outcome = "allow" | "deny" | "hide";

/** Actions on one ward's records: somebody else's ward is hidden, not forbidden. */
const wardActions: ReadonlySet<Action> = new Set<Action>([
  "return.read",
  "return.submit",
  "return.recall",
  "return.accept",
  "return.reopen",
  "tally.save",
  "tally.correct",
  "correction.decide",
  "tally.history",
  "chart.read",
  "annotation.create",
  "baseline.read",
  "baseline.set",
  "baseline.propose",
  "baseline.decide",
]);

/** Actions on a record that belongs to whoever made it; a lead may always. */
const authorActions: ReadonlySet<Action> = new Set<Action>([
  "import.read",
  "import.commit",
  "import.take-back",
]);

/** Actions that nobody may take on what they themselves proposed. */
const otherPersonActions: ReadonlySet<Action> = new Set<Action>(["baseline.decide"]);

/** Actions that infection control may take only on indicators that its team owns. */
const ownTeamActions: ReadonlySet<Action> = new Set<Action>(["baseline.propose"]);

/** By role alone: false for unknown roles, unknown actions and whoever is not signed in. */
export function mayAttempt(actor: Actor, action: Action): boolean {
  if (actor.kind === "system") return Object.hasOwn(actionTable, action);
  if (actor.kind !== "person") return false;
  if (!Object.hasOwn(actionTable, action)) return false;
  const answers: Partial<Record<string, true>> = actionTable[action];
  return Object.hasOwn(answers, actor.role) && answers[actor.role] === true;
}

/** The full decision, on the record's facts. */
export function decide(actor: Actor, action: Action, facts: Facts): Outcome {
  if (!mayAttempt(actor, action)) return "deny";
  if (actor.kind === "system") return "allow";
  const person = actor as PersonActor;

  if (wardActions.has(action)) {
    if (facts.wardId === undefined) return "deny";
    if (person.role === "ward_nurse" && !person.wardIds.includes(facts.wardId)) return "hide";
  }
  if (authorActions.has(action)) {
    if (facts.authorId === undefined) return "deny";
    if (person.role !== "quality_lead" && facts.authorId !== person.personId) return "hide";
  }
  if (otherPersonActions.has(action)) {
    if (facts.authorId === undefined || facts.authorId === person.personId) return "deny";
  }
  if (ownTeamActions.has(action) && person.role === "infection_control") {
    if (facts.team !== "infection_control") return "deny";
  }
  if (action === "tally.save") return decideTallySave(person, facts);
  return "allow";
}

/** A ward types its own lines, infection control the lines that its team counts, a lead both. */
function decideTallySave(person: PersonActor, facts: Facts): Outcome {
  if (facts.team === undefined || facts.numeratorBy === undefined) return "deny";
  if (person.role === "infection_control") {
    return facts.numeratorBy === "team" && facts.team === "infection_control" ? "allow" : "deny";
  }
  return "allow";
}

/** First line of every verb and read: may this role attempt it at all? */
export function requireAction(actor: Actor, action: Action): void {
  if (actor.kind === "anonymous") throw new DomainError("unauthenticated", "Sign in first.");
  if (!mayAttempt(actor, action)) throw new DomainError("forbidden", "Your role doesn't allow this.");
}

/** Inside the verb, once the record's facts are known. */
export function authorize(actor: Actor, action: Action, facts: Facts): void {
  requireAction(actor, action);
  const outcome = decide(actor, action, facts);
  if (outcome === "hide") throw new DomainError("not-found", "There is no such record.");
  if (outcome === "deny") throw new DomainError("forbidden", "This isn't yours to do.");
}

/** For showing or hiding a control; never instead of `authorize`. */
export function can(actor: Actor, action: Action, facts: Facts = {}): boolean {
  return decide(actor, action, facts) === "allow";
}

/** The wards that a query must filter by; `queries.ts` files take it as an argument. */
export type Scope = { wards: "all" } | { wards: readonly string[] };

export function scopeOf(actor: Actor): Scope {
  if (actor.kind === "system") return { wards: "all" };
  if (actor.kind !== "person") return { wards: [] };
  if (actor.role === "ward_nurse") return { wards: actor.wardIds };
  return actor.role === "infection_control" || actor.role === "quality_lead"
    ? { wards: "all" }
    : { wards: [] };
}

export function inScope(scope: Scope, wardId: string): boolean {
  return scope.wards === "all" || scope.wards.includes(wardId);
}

/** True where the person types numerators for their own ward only, so lines counted by a team are shown, not typed. */
export function typesNumerator(actor: Actor, facts: { numeratorBy: "ward" | "team"; team: Team }): boolean {
  if (actor.kind !== "person") return actor.kind === "system";
  if (actor.role === "quality_lead") return true;
  if (actor.role === "infection_control")
    return facts.numeratorBy === "team" && facts.team === "infection_control";
  return actor.role === "ward_nurse" && facts.numeratorBy === "ward";
}
