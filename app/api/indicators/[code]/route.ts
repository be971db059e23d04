import { route } from "@/lib/http";
import { indicatorParams, indicatorSchema, updateIndicatorSchema } from "@/lib/schemas/indicator";
import { getIndicatorByCode, indicatorReply, updateIndicator } from "@/lib/services/indicators";

export const GET = route({
  summary: "One indicator with all versions of its definition",
  params: indicatorParams,
  response: indicatorSchema,
  run: async ({ ctx, params }) => indicatorReply(await getIndicatorByCode({ ctx, code: params.code })),
});

export const PATCH = route({
  summary: "Change an indicator; new words of the definition make a new version from a month on",
  params: indicatorParams,
  body: updateIndicatorSchema,
  response: indicatorSchema,
  run: async ({ ctx, params, body }) =>
    indicatorReply(await updateIndicator({ ctx, input: { ...body, code: params.code } })),
});
