import { route } from "@/lib/http";
import { chartParams, chartQuery, chartSchema } from "@/lib/schemas/chart";
import { getChart } from "@/lib/services/charts";

export const GET = route({
  summary: "A ward's indicator as a chart: values, centre line, limits and signals",
  params: chartParams,
  query: chartQuery,
  response: chartSchema,
  run: ({ ctx, params, query }) => getChart({ ctx, input: { ...query, ...params } }),
});
