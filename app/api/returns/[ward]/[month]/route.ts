import { route } from "@/lib/http";
import { returnParams, wardReturnSchema } from "@/lib/schemas/ward-return";
import { getReturn } from "@/lib/services/returns";

export const GET = route({
  summary: "A ward's return of a month, every assigned indicator in it",
  params: returnParams,
  response: wardReturnSchema,
  run: ({ ctx, params }) => getReturn({ ctx, input: params }),
});
