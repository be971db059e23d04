import { route } from "@/lib/http";
import { changeReturnSchema, returnParams, wardReturnSchema } from "@/lib/schemas/ward-return";
import { submitReturn } from "@/lib/services/returns";

export const POST = route({
  summary: "Send a return; 422 lists what is missing",
  params: returnParams,
  body: changeReturnSchema,
  response: wardReturnSchema,
  run: ({ ctx, params, body }) => submitReturn({ ctx, input: { ...body, ...params } }),
});
