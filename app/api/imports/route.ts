import { readUploadedFile } from "@/app/api/imports/_upload";
import { route } from "@/lib/http";
import { importListQuery, importListSchema, importSchema } from "@/lib/schemas/import";
import { checkImport, listImports } from "@/lib/services/imports";

export const GET = route({
  summary: "Imports, newest first; one's own, or all for a lead",
  query: importListQuery,
  response: importListSchema,
  run: ({ ctx, query }) => listImports({ ctx, input: query }),
});

export const POST = route({
  summary: "Check a workbook or CSV (multipart, field file): what each row would do; nothing is changed",
  response: importSchema,
  run: async ({ ctx, request }) => checkImport({ ctx, input: await readUploadedFile(ctx.actor, request) }),
});
