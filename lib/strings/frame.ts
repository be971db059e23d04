/** Words of the frame round every page: masthead, footer, theme, and the primitives' few fixed words. */
export const frameWords = {
  skipToContent: "Skip to main content",
  startPage: "Ebbline, start page",
  product: "Ebbline",
  mainNavigation: "Main",
  menu: "Menu",
  closeMenu: "Close menu",
  open: "open",
  signOut: "Sign out",
  footerNavigation: "About Ebbline",
  signalCaution:
    "A signal is a prompt to look, never proof of cause, fault or harm; no signal is no proof of safety. " +
    "Raise urgent safety concerns the local way at once, without waiting for a chart.",
  countsOnly: "Counts only: no patient details.",
} as const;

export const themeWords = {
  label: "Theme",
  system: "As on this device",
  light: "Light",
  dark: "Dark",
} as const;

export const primitiveWords = {
  optional: "may be left blank",
  close: "Close",
  needsFixing: (count: number) => (count === 1 ? "1 thing needs fixing" : `${count} things need fixing`),
  reference: (code: string) => `If you ask for help, quote ${code}.`,
} as const;

/** Names of the marks, as read out where a mark stands alone. */
export const markNames = {
  above: "Above the upper action limit",
  below: "Below the lower action limit",
  warn: "Past the warning limit",
  pair: "Two of three past the warning limit",
  run: "Run on one side of the centre line",
  shallow: "Below detection",
  missing: "Missing month",
  late: "Late return",
  corrected: "Corrected after sending",
  leftout: "Left out of the baseline",
  exact: "Own limit decides",
  base: "Change of baseline",
  note: "Note on a month",
  sealed: "Frozen copy",
  fix: "Needs fixing",
  saved: "Saved",
  unsaved: "Not saved, or not yet counted",
  conflict: "Two versions",
  awaited: "Awaited denominator",
  ripening: "Not complete yet",
  withheld: "Withheld",
  stands: "Still stands among all wards",
} as const;

/** The id of a mark in the sprite, without its prefix. */
export type MarkId = keyof typeof markNames;
