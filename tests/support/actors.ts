import { uuidv7 } from "uuidv7";
import type { PersonActor, Role } from "@/lib/policy";

/** A signed-in person for tests; nurses get the ids of their wards. */
export function person(role: Role, name: string, wardIds: string[] = []): PersonActor {
  return {
    kind: "person",
    personId: uuidv7(),
    name,
    email: `${name.toLowerCase().replace(/[^a-z]+/g, ".")}@example.test`,
    role,
    grants: [],
    wardIds,
    sessionId: uuidv7(),
  };
}
