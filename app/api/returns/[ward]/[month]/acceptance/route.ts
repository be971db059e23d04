import { route } from "@/lib/http";
import { changeReturnSchema, returnParams, wardReturnSchema } from "@/lib/schemas/ward-return";
import { acceptReturn } from "@/lib/services/returns";

export const POST = route({
  summary: "Accept a sent return",
  params: returnParams,
  body: changeReturnSchema,
  response: wardReturnSchema,
  run: ({ ctx, params, body }) => acceptReturn({ ctx, input: { ...body, ...params } }),
});
