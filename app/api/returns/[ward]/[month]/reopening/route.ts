import { route } from "@/lib/http";
import { reopenReturnSchema, returnParams, wardReturnSchema } from "@/lib/schemas/ward-return";
import { reopenReturn } from "@/lib/services/returns";

export const POST = route({
  summary: "Open a sent return again, with a reason",
  params: returnParams,
  body: reopenReturnSchema,
  response: wardReturnSchema,
  run: ({ ctx, params, body }) => reopenReturn({ ctx, input: { ...body, ...params } }),
});
