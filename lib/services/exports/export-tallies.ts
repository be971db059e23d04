import "server-only";
import { withTransaction, type Ctx } from "@/db/transaction";
import { authorize, requireAction } from "@/lib/policy";
import type { ExportQuery } from "@/lib/schemas/import";
import { writeAudit } from "@/lib/services/audit";
import { getIndicatorByCode } from "@/lib/services/indicators";
import { getWardByCode } from "@/lib/services/wards";
import { cautionLines } from "@/lib/strings/exports";
import { writeTalliesCsv, writeTalliesWorkbook } from "@/lib/workbook";
import { definitionsTable } from "./definitions-table";
import { readTallies } from "./read-tallies";

export type ExportFormat = "xlsx" | "csv";

interface Export {
  ctx: Ctx;
  input: ExportQuery & { format: ExportFormat };
}

/**
 * The figures as typed, in the sheet that can be brought in again: every row is then the same as now. Lines that are
 * blank, half filled or awaited say nothing yet and are left out. The file is written outside the transaction that
 * notes who took it.
 */
export async function exportTallies({ ctx, input }: Export): Promise<Uint8Array> {
  requireAction(ctx.actor, "export.tallies");
  const ward = input.ward === undefined ? null : await getWardByCode({ ctx, code: input.ward });
  const indicator =
    input.indicator === undefined ? null : await getIndicatorByCode({ ctx, code: input.indicator });
  const { from, to, format } = input;
  const filter = { from, to, wardId: ward?.id, indicatorId: indicator?.id };
  const tallies = await readTallies(ctx, filter);
  const definitions = await definitionsTable(ctx, indicator?.id);
  await withTransaction(ctx, async (tx) => {
    authorize(tx.actor, "export.tallies", {});
    writeAudit(tx, {
      action: "export.tallies",
      subject: { type: "export", id: `tallies.${format}` },
      after: { from, to, ward: ward?.code, indicator: indicator?.code, rows: tallies.length },
    });
  });
  return format === "csv"
    ? writeTalliesCsv(tallies)
    : writeTalliesWorkbook({ tallies, definitions, cautions: cautionLines });
}
