import { route } from "@/lib/http";
import { importParams, importRowsQuery, importSchema, importSummarySchema } from "@/lib/schemas/import";
import { getImport, takeBackImport } from "@/lib/services/imports";

export const GET = route({
  summary: "A checked sheet with a page of its rows",
  params: importParams,
  query: importRowsQuery,
  response: importSchema,
  run: ({ ctx, params, query }) => getImport({ ctx, input: { ...query, id: params.id } }),
});

export const DELETE = route({
  summary: "Take a committed import back, where no later change stands on top of it",
  params: importParams,
  response: importSummarySchema,
  run: ({ ctx, params }) => takeBackImport({ ctx, input: { id: params.id } }),
});
