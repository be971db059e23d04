import { route } from "@/lib/http";
import { createIndicatorSchema, indicatorListSchema, indicatorSchema } from "@/lib/schemas/indicator";
import { createIndicator, indicatorReply, listIndicators } from "@/lib/services/indicators";

export const GET = route({
  summary: "Indicators with all versions of their definitions, by name",
  response: indicatorListSchema,
  run: async ({ ctx }) => ({ items: (await listIndicators({ ctx })).map(indicatorReply), nextCursor: null }),
});

export const POST = route({
  summary: "Add an indicator with its first definition",
  body: createIndicatorSchema,
  response: indicatorSchema,
  status: 201,
  run: async ({ ctx, body }) => indicatorReply(await createIndicator({ ctx, input: body })),
});
