import { fileResponse, route } from "@/lib/http";
import { templateQuery } from "@/lib/schemas/import";
import { makeTemplate } from "@/lib/services/imports";
import { XLSX_TYPE } from "@/lib/workbook";

export const GET = route({
  summary: "Workbook to fill in for a month: a row for every line of one's wards, or of one ward",
  query: templateQuery,
  run: async ({ ctx, query }) => {
    const bytes = await makeTemplate({ ctx, input: query });
    return fileResponse(bytes, `ebbline-${query.ward ?? "wards"}-${query.month}.xlsx`, XLSX_TYPE);
  },
});
