import { fileResponse, route } from "@/lib/http";
import { exportQuery } from "@/lib/schemas/import";
import { exportTallies } from "@/lib/services/exports";
import { XLSX_TYPE } from "@/lib/workbook";

export const GET = route({
  summary: "Tallies as a workbook that can be brought in again",
  query: exportQuery,
  run: async ({ ctx, query }) => {
    const bytes = await exportTallies({ ctx, input: { ...query, format: "xlsx" } });
    return fileResponse(bytes, "ebbline-tallies.xlsx", XLSX_TYPE);
  },
});
