import { route } from "@/lib/http";
import { changeReturnSchema, returnParams, wardReturnSchema } from "@/lib/schemas/ward-return";
import { recallReturn } from "@/lib/services/returns";

export const POST = route({
  summary: "Take a sent return back until it is accepted",
  params: returnParams,
  body: changeReturnSchema,
  response: wardReturnSchema,
  run: ({ ctx, params, body }) => recallReturn({ ctx, input: { ...body, ...params } }),
});
