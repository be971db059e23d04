export { createPerson } from "./create-person";
export { acceptInvitation, findInvitation, type OpenInvitation } from "./accept-invitation";
export { inviteFirstLead } from "./invite-first-lead";
export { inviteAgain, invitePerson, type InvitedPerson } from "./invite-person";
export type { IssuedInvitation } from "./internal";
export { getMe, listPeople } from "./queries";
export { updatePerson } from "./update-person";
