import { fileResponse, route } from "@/lib/http";
import { exportQuery } from "@/lib/schemas/import";
import { exportTallies } from "@/lib/services/exports";
import { CSV_TYPE } from "@/lib/workbook";

export const GET = route({
  summary: "Tallies as CSV that can be brought in again",
  query: exportQuery,
  run: async ({ ctx, query }) => {
    const bytes = await exportTallies({ ctx, input: { ...query, format: "csv" } });
    return fileResponse(bytes, "ebbline-tallies.csv", CSV_TYPE);
  },
});
