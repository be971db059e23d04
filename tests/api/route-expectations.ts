import type { DemoAccount } from "@/tests/support/http-client";
import { osierSheet, type World } from "./walk-world";

export type Statuses = Record<DemoAccount, number>;

/** A call that is well formed and could succeed, and what each account gets for it. */
export interface Probe {
  /** Values of the path's parameters. */
  params?: (world: World) => Record<string, string>;
  query?: string;
  body?: (world: World) => unknown;
  statuses: Statuses;
}

/** A change that is based on a version from the future: whoever may make it gets 409, and nothing moves. */
const STALE = 999;

const leadOnly = (lead: number): Statuses => ({ board: 403, nurse2: 403, infection: 403, nurse: 403, lead });
const staff = (status: number): Statuses => ({
  ...leadOnly(status),
  nurse2: status,
  infection: status,
  nurse: status,
});
/** Of Osier ward, which is the first nurse's: to the other one it isn't there. */
const osier = (status: number): Statuses => ({ ...staff(status), nurse2: 404 });
/** The same where infection control has no part. */
const osierWard = (status: number): Statuses => ({ ...osier(status), infection: 403 });
const everyone = (status: number): Statuses => ({ ...staff(status), board: status });

const sheet = () => {
  const form = new FormData();
  form.set("file", new File([osierSheet("2026-12")], "osier.csv"));
  return form;
};

const line = () => ({ ward: "OSIER", indicator: "FALLS" });
const sentReturn = () => ({ ward: "OSIER", month: "2026-10" });
const openReturn = () => ({ ward: "OSIER", month: "2026-11" });

/**
 * Who gets what, written down apart from the policy that decides it. A route that isn't here fails the walk; one
 * that answers a board member needs its reason in `openToBoard`.
 */
export const probes: Record<string, Probe> = {
  "POST /api/annotations": {
    body: () => ({ ...line(), month: "2026-10", text: "New floor mats" }),
    statuses: osier(201),
  },
  "PUT /api/assignments/{ward}/{indicator}": {
    params: line,
    body: () => ({ from: "2023-12", to: null }),
    statuses: leadOnly(200),
  },
  "GET /api/assignments": { query: "ward=OSIER", statuses: osier(200) },
  "GET /api/audit": { query: "limit=5", statuses: leadOnly(200) },
  "POST /api/baselines/{ward}/{indicator}/decision": {
    params: () => ({ ward: "OSIER", indicator: "HANDS" }),
    body: ({ baselineId }) => ({ id: baselineId, agree: false, version: STALE }),
    statuses: leadOnly(409),
  },
  "GET /api/baselines/{ward}/{indicator}/preview": {
    params: line,
    query: "from=2024-01&to=2025-12",
    statuses: osier(200),
  },
  "GET /api/baselines/{ward}/{indicator}": { params: line, statuses: osier(200) },
  "PUT /api/baselines/{ward}/{indicator}": {
    params: line,
    body: () => ({ from: "2024-01", to: "2025-12", reason: "Two whole years.", version: STALE }),
    statuses: leadOnly(409),
  },
  "GET /api/charts/{ward}/{indicator}": { params: line, statuses: osier(200) },
  "POST /api/corrections/{id}/decision": {
    params: ({ correctionId }) => ({ id: correctionId }),
    body: () => ({ agree: false, version: STALE }),
    statuses: leadOnly(409),
  },
  "GET /api/corrections": { query: "ward=OSIER", statuses: osier(200) },
  "GET /api/exports/tallies.csv": { query: "ward=OSIER&from=2026-09", statuses: osier(200) },
  "GET /api/exports/tallies.xlsx": { query: "ward=OSIER&from=2026-09", statuses: osier(200) },
  "GET /api/health": { statuses: everyone(200) },
  "GET /api/hospital": { statuses: staff(200) },
  "PATCH /api/hospital": { body: () => ({ dueDay: 9, version: STALE }), statuses: leadOnly(409) },
  "POST /api/imports/{id}/commit": {
    params: ({ checkedImportId }) => ({ id: checkedImportId }),
    body: () => ({}),
    statuses: osierWard(200),
  },
  "GET /api/imports/{id}": {
    params: ({ committedImportId }) => ({ id: committedImportId }),
    statuses: osierWard(200),
  },
  "DELETE /api/imports/{id}": {
    params: ({ committedImportId }) => ({ id: committedImportId }),
    statuses: osierWard(200),
  },
  "GET /api/imports": { statuses: { ...staff(200), infection: 403 } },
  // Somebody else's ward is said of the row that names it.
  "POST /api/imports": { body: sheet, statuses: { ...staff(200), infection: 403 } },
  "GET /api/imports/template.xlsx": { query: "month=2026-11&ward=OSIER", statuses: osierWard(200) },
  "GET /api/indicators/{code}": { params: () => ({ code: "FALLS" }), statuses: staff(200) },
  "PATCH /api/indicators/{code}": {
    params: () => ({ code: "FALLS" }),
    body: () => ({ name: "Falls seen", version: STALE }),
    statuses: leadOnly(409),
  },
  "GET /api/indicators": { statuses: staff(200) },
  "POST /api/indicators": {
    body: () => ({
      code: "WALKED",
      name: "Rounds walked",
      numeratorLabel: "Rounds walked",
      denominatorLabel: "Rounds due",
      kind: "proportion",
      betterWhen: "higher",
      team: "quality",
    }),
    statuses: leadOnly(201),
  },
  // Whoever has no right link gets the same answer.
  "POST /api/invitations": {
    body: () => ({ token: "a".repeat(43), password: "a sentence of many words" }),
    statuses: everyone(404),
  },
  "GET /api/me": { statuses: everyone(200) },
  "GET /api/openapi.json": { statuses: everyone(200) },
  "POST /api/people/{id}/invitation": {
    params: ({ personId }) => ({ id: personId }),
    statuses: leadOnly(201),
  },
  "PATCH /api/people/{id}": {
    params: ({ personId }) => ({ id: personId }),
    body: () => ({ name: "Ira Fennick-Lowe", version: STALE }),
    statuses: leadOnly(409),
  },
  "GET /api/people": { statuses: leadOnly(200) },
  "POST /api/people": {
    body: () => ({ email: "other@harrowmere.example", name: "Odo Trewin", role: "infection_control" }),
    statuses: leadOnly(201),
  },
  "POST /api/returns/{ward}/{month}/acceptance": {
    params: sentReturn,
    body: () => ({}),
    statuses: leadOnly(409),
  },
  "POST /api/returns/{ward}/{month}/corrections": {
    params: sentReturn,
    body: () => ({ indicator: "FALLS", numerator: 1, reason: "Counted again.", version: STALE }),
    statuses: osierWard(409),
  },
  "POST /api/returns/{ward}/{month}/recall": {
    params: sentReturn,
    body: () => ({}),
    statuses: osierWard(409),
  },
  "POST /api/returns/{ward}/{month}/reopening": {
    params: sentReturn,
    body: () => ({ reason: "Counted again.", version: STALE }),
    statuses: leadOnly(409),
  },
  "GET /api/returns/{ward}/{month}": { params: openReturn, statuses: osier(200) },
  "POST /api/returns/{ward}/{month}/submission": {
    params: openReturn,
    body: () => ({}),
    statuses: osierWard(422),
  },
  "GET /api/returns/{ward}/{month}/tallies/{indicator}/history": {
    params: () => ({ ...sentReturn(), ...line() }),
    statuses: osier(200),
  },
  "PUT /api/returns/{ward}/{month}/tallies/{indicator}": {
    params: () => ({ ...openReturn(), ...line() }),
    body: () => ({ numerator: 77, version: STALE }),
    // Infection control types the lines that its team counts, and falls aren't.
    statuses: osierWard(409),
  },
  "GET /api/returns": { query: "ward=OSIER", statuses: osier(200) },
  "GET /api/signals": { query: "ward=OSIER", statuses: osier(200) },
  "GET /api/wards/{code}": { params: () => ({ code: "OSIER" }), statuses: osier(200) },
  "PATCH /api/wards/{code}": {
    params: () => ({ code: "OSIER" }),
    body: () => ({ name: "Osier and reed", version: STALE }),
    statuses: leadOnly(409),
  },
  "GET /api/wards": { statuses: staff(200) },
  "POST /api/wards": {
    body: () => ({ code: "WALKED", name: "Walked ward", division: "Surgery", openFrom: "2026-01" }),
    statuses: leadOnly(201),
  },
};

/** Why a board member gets an answer here; of everything else board members get 403. */
export const openToBoard: Record<string, string> = {
  "GET /api/health": "anybody may ask whether Ebbline answers",
  "GET /api/me": "who one is oneself",
  "GET /api/openapi.json": "words about addresses, no figures",
  "POST /api/invitations": "a link from an invitation is the right itself; without one there is nothing",
};

/** Answered without signing in, and why. */
export const openToAnyone: Record<string, string> = {
  "GET /api/health": "for whoever watches whether the server runs; says nothing else",
  "POST /api/invitations": "whoever takes up an invitation can't sign in yet",
};
