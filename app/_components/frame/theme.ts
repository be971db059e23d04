/** Where the reader's choice is kept in this browser, and its closed list. "system" is kept as no entry. */
export const themeStorageKey = "ebbline-theme";

export const themes = ["system", "light", "dark"] as const;
export type Theme = (typeof themes)[number];

export function isTheme(text: string | null): text is Theme {
  return themes.some((theme) => theme === text);
}
