/** The four roles: name, what each may do, and what it sees where wards aren't named for each person. */
export const roleWords = {
  ward_nurse: {
    name: "Ward nurse",
    inLine: "ward nurse",
    may:
      "Enters and sends monthly counts for named wards, sees those wards’ charts and signals, answers review " +
      "questions.",
    where: "No ward yet",
  },
  infection_control: {
    name: "Infection control",
    inLine: "infection control",
    may: "Sees all wards. Records reviews and actions for the indicators that the team owns; proposes baselines.",
    where: "All wards",
  },
  board_member: {
    name: "Board member",
    inLine: "board member",
    may: "Reads published packs, asks questions, acknowledges. Sees nothing else.",
    where: "Published packs",
  },
  quality_lead: {
    name: "Quality lead",
    inLine: "quality lead",
    may: "Sets up indicators, wards, people, baselines and due days; accepts returns; drafts and publishes packs.",
    where: "All wards",
  },
} as const;

export const grantWords = {
  "packs:draft": { name: "Prepares packs", may: "May draft packs without any other extra power." },
} as const;

export const peopleWords = {
  setUp: "Set-up",
  title: "People and roles",
  subtitle: (people: number, invited: number) =>
    `${people === 1 ? "1 person" : `${people} people`}.${invited === 0 ? "" : ` ${invited} invited and not here yet.`}`,
  invite: "Invite someone",
  caption: "People",
  name: "Name",
  email: "Hospital email",
  role: "Role",
  roleNote: "one for each person",
  where: "Where",
  lastSignIn: "Last signed in",
  never: "Not yet",
  /** A day by the reader's calendar; UTC, so that server and browser write the same. */
  day: (instant: string) =>
    new Intl.DateTimeFormat("en-GB", {
      day: "numeric",
      month: "short",
      year: "numeric",
      timeZone: "UTC",
    }).format(new Date(instant)),
  invited: "Invited, not yet accepted",
  off: "Switched off",
  edit: "Edit",
  editWho: (name: string) => `Edit ${name}`,
  wards: "Wards",
  noWardsMade: "There are no wards yet. Add them under Set-up first.",
  extra: "Extra",
  takesEffect: "Takes effect with their next click, and is written to the record of changes with your name.",
  save: "Save changes",
  saving: "Saving",
  cancel: "Cancel",
  switchOff: "Switch off",
  switchOn: "Switch on",
  newLink: "Make a new link",
  newLinkNote: "For somebody who lost the link or forgot the password. Earlier links stop working.",
  sendInvitation: "Make the invitation",
  inviteTitle: "Invite someone",
  inviteNote: "You get a link to hand over. With it they choose a password.",
  linkTitle: (name: string) => `A link for ${name}`,
  linkNote:
    "Hand it over yourself; it is shown only now, works once and holds for seven days. Whoever has it can sign in as " +
    "this person.",
  linkLabel: "Link",
  copy: "Copy",
  copied: "Copied",
  staleTitle: "Two versions",
  stale: (name: string) =>
    `Somebody else changed ${name} meanwhile. What they saved is shown now; check, then save again.`,
  saved: "Saved.",
} as const;

export const packWords = {
  title: "Packs",
  emptyTitle: "No pack has been published yet.",
  empty:
    "When a quarter’s pack is published it stands here as a frozen copy, with what stands out and how far it can be " +
    "trusted.",
} as const;

export const navigationWords = {
  myPage: "My page",
  returns: "Returns",
  charts: "Charts",
  signals: "Signals",
  bringIn: "Bring in",
  packs: "Packs",
  setUp: "Set-up",
} as const;
