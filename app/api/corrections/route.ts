import { route } from "@/lib/http";
import { correctionListQuery, correctionListSchema } from "@/lib/schemas/correction";
import { listCorrections } from "@/lib/services/corrections";

export const GET = route({
  summary: "Corrections that were asked for, newest first; a nurse sees their own wards'",
  query: correctionListQuery,
  response: correctionListSchema,
  run: ({ ctx, query }) => listCorrections({ ctx, input: query }),
});
