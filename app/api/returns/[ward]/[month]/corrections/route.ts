import { route } from "@/lib/http";
import { correctionResultSchema, correctTallySchema } from "@/lib/schemas/correction";
import { returnParams } from "@/lib/schemas/ward-return";
import { correctTally } from "@/lib/services/corrections";

export const POST = route({
  summary: "Correct a line of a sent return, with a reason; a nurse's correction waits for a lead",
  params: returnParams,
  body: correctTallySchema,
  response: correctionResultSchema,
  run: ({ ctx, params, body }) => correctTally({ ctx, input: { ...body, ...params } }),
});
