import type { Statuses } from "./route-expectations";
import type { World } from "./walk-world";

/** An address of a page and what each account gets for it. */
export interface PageProbe {
  path: (world: World) => string;
  statuses: Statuses;
}

const staff: Statuses = { board: 403, nurse2: 200, infection: 200, nurse: 200, lead: 200 };
/** Of Osier ward, which is the first nurse's: to the other one it isn't there. */
const osier: Statuses = { ...staff, nurse2: 404 };
const leadOnly: Statuses = { board: 403, nurse2: 403, infection: 403, nurse: 403, lead: 200 };
const everyone: Statuses = { ...staff, board: 200 };
const sheets: Statuses = { ...staff, infection: 403 };
const nowhere: Statuses = { board: 403, nurse2: 404, infection: 404, nurse: 404, lead: 404 };

const at = (path: string, statuses: Statuses): PageProbe => ({ path: () => path, statuses });

/** Every page for whoever has signed in, by the address that its folder spells. */
export const pageProbes: Record<string, PageProbe[]> = {
  // Board members are sent on to the packs, the one thing that waits for them.
  "/": [at("/", { ...staff, board: 307 })],
  "/charts": [at("/charts", staff), at("/charts?ward=OSIER", osier), at("/charts?ward=NOWHERE", nowhere)],
  "/charts/[ward]/[indicator]": [
    at("/charts/OSIER/FALLS", osier),
    at("/charts/osier/falls?by=quarter&limits=exact&asOf=2026-06-30", osier),
    at("/charts/OSIER/PAIN", nowhere),
    at("/charts/NOWHERE/FALLS", nowhere),
  ],
  "/charts/[ward]/[indicator]/baseline": [
    at("/charts/OSIER/HANDS/baseline", osier),
    at("/charts/OSIER/FALLS/baseline?from=2024-01&to=2025-12", osier),
  ],
  "/imports": [at("/imports", sheets)],
  "/imports/[id]": [
    { path: ({ checkedImportId }) => `/imports/${checkedImportId}`, statuses: { ...sheets, nurse2: 404 } },
    at("/imports/0199a0c0-0000-7000-8000-000000000000", { ...nowhere, infection: 403 }),
  ],
  "/packs": [at("/packs", everyone)],
  "/people": [at("/people", leadOnly)],
  "/returns": [at("/returns", staff), at("/returns?ward=OSIER", osier), at("/returns?month=2026-10", staff)],
  "/returns/[ward]/[month]": [
    at("/returns/OSIER/2026-11", osier),
    at("/returns/OSIER/2026-10", osier),
    at("/returns/OSIER/2031-01", nowhere),
  ],
  "/returns/[ward]/[month]/[indicator]": [
    at("/returns/OSIER/2026-10/FALLS", osier),
    at("/returns/OSIER/2026-11/FALLS", osier),
    at("/returns/OSIER/2026-10/PAIN", nowhere),
  ],
  "/set-up": [at("/set-up", leadOnly)],
  "/set-up/assignments": [
    at("/set-up/assignments", leadOnly),
    at("/set-up/assignments?ward=OSIER", leadOnly),
    at("/set-up/assignments?indicator=FALLS", leadOnly),
    at("/set-up/assignments?ward=NOWHERE", { ...leadOnly, lead: 404 }),
  ],
  "/set-up/hospital": [at("/set-up/hospital", leadOnly)],
  "/set-up/indicators": [at("/set-up/indicators", leadOnly)],
  "/set-up/indicators/[code]": [
    at("/set-up/indicators/FALLS", leadOnly),
    at("/set-up/indicators/NOWHERE", { ...leadOnly, lead: 404 }),
  ],
  "/set-up/indicators/new": [at("/set-up/indicators/new", leadOnly)],
  "/set-up/record": [at("/set-up/record", leadOnly), at("/set-up/record?cursor=rubbish", leadOnly)],
  "/set-up/wards": [at("/set-up/wards", leadOnly)],
  "/set-up/wards/[code]": [
    at("/set-up/wards/OSIER", leadOnly),
    at("/set-up/wards/NOWHERE", { ...leadOnly, lead: 404 }),
  ],
  "/set-up/wards/new": [at("/set-up/wards/new", leadOnly)],
  "/signals": [at("/signals", staff), at("/signals?ward=OSIER", osier)],
};

/** Pages that anybody may open, and what somebody signed in gets. */
export const publicPages: Record<string, { path: string; signedIn: number }> = {
  "/cautions": { path: "/cautions", signedIn: 200 },
  "/how-computed": { path: "/how-computed", signedIn: 200 },
  "/invitation/[token]": { path: `/invitation/${"a".repeat(43)}`, signedIn: 200 },
  "/sign-in": { path: "/sign-in", signedIn: 307 },
};
