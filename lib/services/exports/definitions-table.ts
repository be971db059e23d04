import "server-only";
import { listIndicators } from "@/lib/services/indicators";
import type { Ctx } from "@/db/transaction";
import { FROM_THE_BEGINNING } from "@/lib/indicators/definition";
import { exportWords } from "@/lib/strings/exports";
import { teamNames } from "@/lib/strings/imports";
import type { PlainTable } from "@/lib/workbook";

/** Every version of what is counted out of what, so that a file explains itself. */
export async function definitionsTable(ctx: Ctx, indicatorId: string | undefined): Promise<PlainTable> {
  const details = await listIndicators({ ctx });
  const chosen = details.filter((detail) => indicatorId === undefined || detail.id === indicatorId);
  return {
    columns: exportWords.definitionColumns.map(({ title, width }) => ({ title, width })),
    rows: chosen.flatMap((detail) =>
      detail.definitions.map((version) => [
        detail.code,
        detail.name,
        version.number,
        version.effectiveFrom === FROM_THE_BEGINNING ? "" : version.effectiveFrom,
        version.numeratorLabel,
        version.denominatorLabel,
        version.attribution,
        exportWords.kinds[detail.kind],
        detail.per,
        exportWords.directions[detail.betterWhen],
        teamNames[detail.team],
        detail.sharedDenominator?.code ?? "",
        version.comparable ? exportWords.comparable : exportWords.notComparable,
      ]),
    ),
  };
}
