export { endSession, endSessionsOf, type EndedWhy } from "./end-session";
export { findSessionActor } from "./find-session-actor";
export { hashPassword, isPassword } from "./password-hash";
export { ABSOLUTE_LIMIT, IDLE_LIMIT } from "./session-limits";
export { startSession, type SignInTry, type StartedSession } from "./start-session";
