import { route } from "@/lib/http";
import { correctionParams, correctionResultSchema, decideCorrectionSchema } from "@/lib/schemas/correction";
import { decideCorrection } from "@/lib/services/corrections";

export const POST = route({
  summary: "Agree to a correction or decline it",
  params: correctionParams,
  body: decideCorrectionSchema,
  response: correctionResultSchema,
  run: ({ ctx, params, body }) => decideCorrection({ ctx, input: { ...body, ...params } }),
});
