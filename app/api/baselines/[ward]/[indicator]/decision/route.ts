import { route } from "@/lib/http";
import { baselineParams, baselineSchema, decideBaselineSchema } from "@/lib/schemas/baseline";
import { decideBaseline } from "@/lib/services/baselines";

export const POST = route({
  summary: "Decide a proposed baseline; never by the proposer",
  params: baselineParams,
  body: decideBaselineSchema,
  response: baselineSchema,
  run: ({ ctx, params, body }) => decideBaseline({ ctx, input: { ...body, ...params } }),
});
