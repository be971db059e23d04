import { route } from "@/lib/http";
import { auditPageSchema, auditQuery } from "@/lib/schemas/audit";
import { getAuditPage } from "@/lib/services/audit";

export const GET = route({
  summary: "The record of changes, newest first, and whether its chain verifies",
  query: auditQuery,
  response: auditPageSchema,
  run: ({ ctx, query }) => getAuditPage({ ctx, input: query }),
});
