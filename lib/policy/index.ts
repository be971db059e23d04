export { actions, actionTable, type Action } from "./actions";
export {
  actorName,
  anonymousActor,
  systemActor,
  type Actor,
  type AnonymousActor,
  type PersonActor,
  type SystemActor,
} from "./actor";
export {
  authorize,
  can,
  decide,
  inScope,
  mayAttempt,
  requireAction,
  scopeOf,
  typesNumerator,
  type Facts,
  type Outcome,
  type Scope,
} from "./policy";
export { hasNamedWards, LEAD_ROLE, mayHoldGrants } from "./role-facts";
export { grants, roles, tokenScopes, type Grant, type Role, type TokenScope } from "./roles";
