import { route } from "@/lib/http";
import { saveTallySchema, tallyParams, tallyReplySchema } from "@/lib/schemas/tally";
import { saveTally } from "@/lib/services/tallies";

export const PUT = route({
  summary: "Save fields of one line of an open return; a field left out keeps its value",
  params: tallyParams,
  body: saveTallySchema,
  response: tallyReplySchema,
  run: ({ ctx, params, body }) => saveTally({ ctx, input: { ...body, ...params } }),
});
