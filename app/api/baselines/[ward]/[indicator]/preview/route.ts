import { route } from "@/lib/http";
import { baselineParams, previewBaselineQuery, previewBaselineSchema } from "@/lib/schemas/baseline";
import { previewBaselineReply } from "@/lib/services/baselines";

export const GET = route({
  summary: "What a baseline would change: limits before and after, signals that come and go",
  params: baselineParams,
  query: previewBaselineQuery,
  response: previewBaselineSchema,
  run: ({ ctx, params, query }) => previewBaselineReply({ ctx, input: { ...query, ...params } }),
});
