import type { Grant, Role } from "./roles";

/** A person who is signed in, as read from the database with this request. */
export interface PersonActor {
  kind: "person";
  personId: string;
  name: string;
  email: string;
  role: Role;
  grants: readonly Grant[];
  /** Ids of the person's own wards, and of wards that they cover today; nurses only. */
  wardIds: readonly string[];
  sessionId: string;
}

/** Work without a person: set-up, schedules, the outbox. It may do what its verb needs and is named in the audit. */
export interface SystemActor {
  kind: "system";
  name: string;
}

/** Somebody who has not signed in: may sign in, accept an invitation, and nothing else. */
export interface AnonymousActor {
  kind: "anonymous";
}

export type Actor = PersonActor | SystemActor | AnonymousActor;

export function systemActor(name: string): SystemActor {
  return { kind: "system", name };
}

export const anonymousActor: AnonymousActor = { kind: "anonymous" };

/** The name that records keep beside a change. */
export function actorName(actor: Actor): string {
  return actor.kind === "anonymous" ? "not signed in" : actor.name;
}
