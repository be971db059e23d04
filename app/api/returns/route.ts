import { route } from "@/lib/http";
import { returnListQuery, returnListSchema } from "@/lib/schemas/ward-return";
import { listReturns } from "@/lib/services/returns";

export const GET = route({
  summary: "Returns of the last twelve months, newest first; a nurse sees their own wards'",
  query: returnListQuery,
  response: returnListSchema,
  run: async ({ ctx, query }) => ({ items: await listReturns({ ctx, input: query }), nextCursor: null }),
});
