import { route } from "@/lib/http";
import { personParams, personSchema, updatePersonSchema } from "@/lib/schemas/person";
import { updatePerson } from "@/lib/services/people";

export const PATCH = route({
  summary: "Changes name, role, wards or extra powers, or switches somebody on or off",
  params: personParams,
  body: updatePersonSchema,
  response: personSchema,
  run: ({ ctx, params, body }) => updatePerson({ ctx, input: { ...body, id: params.id } }),
});
