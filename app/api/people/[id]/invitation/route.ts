import { invitationLink } from "@/lib/config/public-url";
import { route } from "@/lib/http";
import { invitedPersonSchema, personParams } from "@/lib/schemas/person";
import { inviteAgain } from "@/lib/services/people";

export const POST = route({
  summary: "A new link to choose a password, shown this once; earlier links stop working",
  params: personParams,
  response: invitedPersonSchema,
  status: 201,
  run: async ({ ctx, params }) => {
    const { person, invitation } = await inviteAgain({ ctx, input: params });
    const { token, expiresAt } = invitation;
    return { ...person, invitation: { link: invitationLink(token), expiresAt: expiresAt.toISOString() } };
  },
});
