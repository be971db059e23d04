import { z } from "zod";
import { route } from "@/lib/http";
import { acceptInvitationSchema } from "@/lib/schemas/sign-in";
import { acceptInvitation } from "@/lib/services/people";

export const POST = route({
  summary: "Takes up an invitation: chooses a password by a link that works once",
  openToAnyone: true,
  body: acceptInvitationSchema,
  response: z.object({ email: z.string() }),
  run: ({ ctx, body }) => acceptInvitation({ ctx, input: body }),
});
