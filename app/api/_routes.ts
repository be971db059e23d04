import * as annotations from "@/app/api/annotations/route";
import * as assignment from "@/app/api/assignments/[ward]/[indicator]/route";
import * as assignments from "@/app/api/assignments/route";
import * as audit from "@/app/api/audit/route";
import * as baselineDecision from "@/app/api/baselines/[ward]/[indicator]/decision/route";
import * as baselinePreview from "@/app/api/baselines/[ward]/[indicator]/preview/route";
import * as baseline from "@/app/api/baselines/[ward]/[indicator]/route";
import * as chart from "@/app/api/charts/[ward]/[indicator]/route";
import * as correctionDecision from "@/app/api/corrections/[id]/decision/route";
import * as corrections from "@/app/api/corrections/route";
import * as talliesCsv from "@/app/api/exports/tallies.csv/route";
import * as talliesXlsx from "@/app/api/exports/tallies.xlsx/route";
import * as health from "@/app/api/health/route";
import * as importCommit from "@/app/api/imports/[id]/commit/route";
import * as importRun from "@/app/api/imports/[id]/route";
import * as hospital from "@/app/api/hospital/route";
import * as imports from "@/app/api/imports/route";
import * as importTemplate from "@/app/api/imports/template.xlsx/route";
import * as indicator from "@/app/api/indicators/[code]/route";
import * as indicators from "@/app/api/indicators/route";
import * as invitations from "@/app/api/invitations/route";
import * as me from "@/app/api/me/route";
import * as personInvitation from "@/app/api/people/[id]/invitation/route";
import * as person from "@/app/api/people/[id]/route";
import * as people from "@/app/api/people/route";
import * as returnAcceptance from "@/app/api/returns/[ward]/[month]/acceptance/route";
import * as returnCorrections from "@/app/api/returns/[ward]/[month]/corrections/route";
import * as returnRecall from "@/app/api/returns/[ward]/[month]/recall/route";
import * as returnReopening from "@/app/api/returns/[ward]/[month]/reopening/route";
import * as wardReturn from "@/app/api/returns/[ward]/[month]/route";
import * as returnSubmission from "@/app/api/returns/[ward]/[month]/submission/route";
import * as tallyHistory from "@/app/api/returns/[ward]/[month]/tallies/[indicator]/history/route";
import * as tally from "@/app/api/returns/[ward]/[month]/tallies/[indicator]/route";
import * as returns from "@/app/api/returns/route";
import * as signals from "@/app/api/signals/route";
import * as ward from "@/app/api/wards/[code]/route";
import * as wards from "@/app/api/wards/route";
import type { RouteModule } from "@/app/api/openapi.json/document";

/**
 * Every route file by its path, for the API's own description; a test walks the folders and fails where one is
 * missing. The description adds itself, since it can't import itself; next-auth's route answers for itself, and the
 * one for unknown addresses isn't described.
 */
export const routeModules = {
  "/api/annotations": annotations,
  "/api/assignments/{ward}/{indicator}": assignment,
  "/api/assignments": assignments,
  "/api/audit": audit,
  "/api/baselines/{ward}/{indicator}/decision": baselineDecision,
  "/api/baselines/{ward}/{indicator}/preview": baselinePreview,
  "/api/baselines/{ward}/{indicator}": baseline,
  "/api/charts/{ward}/{indicator}": chart,
  "/api/corrections/{id}/decision": correctionDecision,
  "/api/corrections": corrections,
  "/api/exports/tallies.csv": talliesCsv,
  "/api/exports/tallies.xlsx": talliesXlsx,
  "/api/health": health,
  "/api/imports/{id}/commit": importCommit,
  "/api/imports/{id}": importRun,
  "/api/hospital": hospital,
  "/api/imports": imports,
  "/api/imports/template.xlsx": importTemplate,
  "/api/indicators/{code}": indicator,
  "/api/indicators": indicators,
  "/api/invitations": invitations,
  "/api/me": me,
  "/api/people/{id}/invitation": personInvitation,
  "/api/people/{id}": person,
  "/api/people": people,
  "/api/returns/{ward}/{month}/acceptance": returnAcceptance,
  "/api/returns/{ward}/{month}/corrections": returnCorrections,
  "/api/returns/{ward}/{month}/recall": returnRecall,
  "/api/returns/{ward}/{month}/reopening": returnReopening,
  "/api/returns/{ward}/{month}": wardReturn,
  "/api/returns/{ward}/{month}/submission": returnSubmission,
  "/api/returns/{ward}/{month}/tallies/{indicator}/history": tallyHistory,
  "/api/returns/{ward}/{month}/tallies/{indicator}": tally,
  "/api/returns": returns,
  "/api/signals": signals,
  "/api/wards/{code}": ward,
  "/api/wards": wards,
} satisfies Record<string, RouteModule>;
