import { systemActor, type PersonActor, type Role } from "@/lib/policy";
import type { Ctx } from "@/db/transaction";
import { createPerson } from "@/lib/services/people";
import { findWardsByCode } from "./ward-ids";

export const DEMO_PASSWORD = "ebbline-demo";

interface DemoPerson {
  key: string;
  email: string;
  name: string;
  role: Role;
  wards: string[];
}

const at = (name: string) => `${name}@harrowmere.example`;

/** The five accounts of the demo, then the nurses who send for the other wards. All invented. */
const demoPeople: DemoPerson[] = [
  { key: "nurse", email: at("nurse"), name: "Della Quarrie", role: "ward_nurse", wards: ["OSIER", "TERN"] },
  { key: "nurse2", email: at("nurse2"), name: "Tam Oakenby", role: "ward_nurse", wards: ["CURLEW"] },
  { key: "infection", email: at("infection"), name: "Ines Vostal", role: "infection_control", wards: [] },
  { key: "board", email: at("board"), name: "Hale Brantwick", role: "board_member", wards: [] },
  { key: "lead", email: at("lead"), name: "Maro Venndale", role: "quality_lead", wards: [] },
  {
    key: "n3",
    email: at("halloway"),
    name: "Jo Halloway",
    role: "ward_nurse",
    wards: ["SEDGE", "ALDER", "HERON"],
  },
  {
    key: "n4",
    email: at("tarrow"),
    name: "Mina Tarrow",
    role: "ward_nurse",
    wards: ["LINNET", "ROWAN", "BRACKEN"],
  },
  {
    key: "n5",
    email: at("quill"),
    name: "Edda Quill",
    role: "ward_nurse",
    wards: ["TEASEL", "MALLOW", "PLOVER"],
  },
  { key: "n6", email: at("pender"), name: "Sol Pender", role: "ward_nurse", wards: ["WILLOW", "DUNLIN"] },
];

export interface Cast {
  lead: PersonActor;
  infection: PersonActor;
  /** The nurse who sends for a ward, by the ward's code. */
  nurseOf: (ward: string) => PersonActor;
}

/** Makes the people and hands back who acts in the story. */
export async function makePeople(ctx: Ctx): Promise<Cast> {
  const setUp: Ctx = { ...ctx, actor: systemActor("demo") };
  const idOf = await findWardsByCode(setUp);
  const actors = new Map<string, PersonActor>();
  for (const { key, wards, ...person } of demoPeople) {
    const { id } = await createPerson({ ctx: setUp, input: { ...person, wards, password: DEMO_PASSWORD } });
    const wardIds = wards.map((code) => idOf(code));
    actors.set(key, { kind: "person", personId: id, ...person, grants: [], wardIds, sessionId: "demo" });
  }
  const actor = (key: string): PersonActor => {
    const found = actors.get(key);
    if (!found) throw new Error(`The demo has no person called ${key}.`);
    return found;
  };
  const nurseOf = (ward: string) =>
    actor(demoPeople.find((person) => person.wards.includes(ward))?.key ?? "nurse");
  return { lead: actor("lead"), infection: actor("infection"), nurseOf };
}
