import { route } from "@/lib/http";
import { meSchema } from "@/lib/schemas/person";
import { getMe } from "@/lib/services/people";

export const GET = route({
  summary: "Who is signed in, with the wards that are theirs today",
  response: meSchema,
  run: ({ ctx }) => getMe({ ctx }),
});
