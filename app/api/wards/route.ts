import { route } from "@/lib/http";
import { createWardSchema, wardListSchema, wardSchema } from "@/lib/schemas/ward";
import { createWard, listWards } from "@/lib/services/wards";

export const GET = route({
  summary: "Wards, by name; a nurse sees their own",
  response: wardListSchema,
  run: async ({ ctx }) => ({ items: await listWards({ ctx }), nextCursor: null }),
});

export const POST = route({
  summary: "Add a ward",
  body: createWardSchema,
  response: wardSchema,
  status: 201,
  run: ({ ctx, body }) => createWard({ ctx, input: body }),
});
