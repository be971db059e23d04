import { z } from "zod";
import { invitationLink } from "@/lib/config/public-url";
import { route } from "@/lib/http";
import { invitedPersonSchema, invitePersonSchema, personSchema } from "@/lib/schemas/person";
import { invitePerson, listPeople } from "@/lib/services/people";

export const GET = route({
  summary: "Everybody, by name",
  response: z.object({ items: z.array(personSchema), nextCursor: z.string().nullable() }),
  run: async ({ ctx }) => ({ items: await listPeople({ ctx }), nextCursor: null }),
});

export const POST = route({
  summary: "Invites somebody; the link to choose a password is shown this once",
  body: invitePersonSchema,
  response: invitedPersonSchema,
  status: 201,
  run: async ({ ctx, body }) => {
    const { person, invitation } = await invitePerson({ ctx, input: body });
    const { token, expiresAt } = invitation;
    return { ...person, invitation: { link: invitationLink(token), expiresAt: expiresAt.toISOString() } };
  },
});
