import { route } from "@/lib/http";
import { commitImportSchema, importParams, importSummarySchema } from "@/lib/schemas/import";
import { commitImport } from "@/lib/services/imports";

export const POST = route({
  summary: "Bring a checked sheet in, all or nothing",
  params: importParams,
  body: commitImportSchema,
  response: importSummarySchema,
  run: ({ ctx, params, body }) => commitImport({ ctx, input: { ...body, id: params.id } }),
});
