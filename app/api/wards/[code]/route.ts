import { route } from "@/lib/http";
import { updateWardSchema, wardParams, wardSchema } from "@/lib/schemas/ward";
import { getWardByCode, updateWard } from "@/lib/services/wards";

export const GET = route({
  summary: "One ward",
  params: wardParams,
  response: wardSchema,
  run: ({ ctx, params }) => getWardByCode({ ctx, code: params.code }),
});

export const PATCH = route({
  summary: "Change a ward; what is left out keeps its value",
  params: wardParams,
  body: updateWardSchema,
  response: wardSchema,
  run: ({ ctx, params, body }) => updateWard({ ctx, input: { ...body, code: params.code } }),
});
