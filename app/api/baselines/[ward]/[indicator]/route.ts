import { route } from "@/lib/http";
import {
  baselineListSchema,
  baselineParams,
  baselineSchema,
  setBaselineSchema,
} from "@/lib/schemas/baseline";
import { listBaselines, setBaseline } from "@/lib/services/baselines";

export const GET = route({
  summary: "Baselines that a chart had or was proposed, newest first",
  params: baselineParams,
  response: baselineListSchema,
  run: ({ ctx, params }) => listBaselines({ ctx, input: params }),
});

export const PUT = route({
  summary: "Set the first baseline of a chart, or propose a later one",
  params: baselineParams,
  body: setBaselineSchema,
  response: baselineSchema,
  run: ({ ctx, params, body }) => setBaseline({ ctx, input: { ...body, ...params } }),
});
