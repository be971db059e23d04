/** Words of signing in, of invitations and of the pages for addresses that lead nowhere. */
export const signInWords = {
  title: "Sign in",
  heading: "Sign in to Ebbline",
  tagline: "Watches each ward’s monthly counts and shows the months that deserve a second look.",
  email: "Hospital email",
  password: "Password",
  submit: "Sign in",
  submitting: "Signing in",
  idle: "You’ll be signed out after 30 minutes without use. Entries you have made are kept.",
  cannot: "I can’t sign in",
  cannotHelp:
    "Ask a quality lead of your hospital for a new link; with it you choose a new password. " +
    "After ten tries that weren’t right, each further one has to wait a little longer.",
  wrong: "The email or the password isn’t right.",
  wait: (minutes: number) =>
    minutes <= 1
      ? "Too many tries. Wait a minute, then try again."
      : `Too many tries. Wait ${minutes} minutes, then try again.`,
  notReached: "Ebbline can’t be reached. Check the connection and try again.",
  broken: "Something went wrong on our side. Your password may well be right. Try again in a moment.",
  needsScript: "Signing in needs JavaScript. Switch it on for this page and load it again.",
  demoTitle: "This is the demo",
  demoNote: "An invented hospital, for trying things out. The password of each account is ebbline-demo.",
  demoUse: "Use",
  demoUseFor: (email: string) => `Use ${email}`,
} as const;

/** The demo's accounts, shown in the demo alone. */
export const demoAccounts = [
  { email: "nurse@harrowmere.example", who: "ward nurse, two wards" },
  { email: "nurse2@harrowmere.example", who: "ward nurse, one other ward" },
  { email: "infection@harrowmere.example", who: "infection control" },
  { email: "board@harrowmere.example", who: "board member" },
  { email: "lead@harrowmere.example", who: "quality lead" },
] as const;

export const seaFigureWords = {
  title: "Reading the channel",
  text:
    "Limits follow each month’s denominator, printed along the lower edge. More patients counted, narrower " +
    "channel. One month here lies above it.",
  centre: "centre line",
} as const;

export const invitationWords = {
  title: "Choose a password",
  heading: (name: string) => `Welcome, ${name}`,
  firstHeading: "Set up the first quality lead",
  intro: "Choose a password. It goes with this email:",
  firstIntro:
    "Whoever uses this link can set up everything: the hospital, wards, indicators and people. It works once.",
  name: "Your name",
  email: "Hospital email",
  password: "New password",
  passwordHint: "12 characters or more. A short sentence works well; no particular signs are asked for.",
  again: "The same password again",
  submit: "Keep this password",
  submitting: "Keeping it",
  done: "Your password is set. You can sign in now.",
  toSignIn: "Go to sign-in",
  goneTitle: "This link can’t be used any more",
  gone:
    "It was used already, is older than seven days, or a newer one was made. Ask a quality lead of your hospital " +
    "for a new link.",
} as const;

export const lostWords = {
  notFoundTitle: "There is nothing at this address",
  notFound: "It may have moved, or it isn’t yours to see. Your counts are safe.",
  forbiddenTitle: "This isn’t part of your role",
  forbidden: "If you need it for your work, ask a quality lead of your hospital.",
  errorTitle: "This page couldn’t be shown",
  error: "Your counts are safe: nothing was changed. Try again; if it stays so, tell your quality lead.",
  again: "Try again",
  toMyPage: "Go to my page",
} as const;
