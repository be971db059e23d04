import { route } from "@/lib/http";
import { tallyHistorySchema, tallyParams } from "@/lib/schemas/tally";
import { getTallyHistory } from "@/lib/services/tallies";

export const GET = route({
  summary: "Every value that one line ever had, oldest first",
  params: tallyParams,
  response: tallyHistorySchema,
  run: ({ ctx, params }) => getTallyHistory({ ctx, input: params }),
});
