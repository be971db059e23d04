"use client";

import { useId, useSyncExternalStore } from "react";
import { isTheme, themes, themeStorageKey, type Theme } from "@/app/_components/frame/theme";
import { themeWords } from "@/lib/strings/frame";

/** Light, dark, or as the device has it; kept in this browser only. */
export function ThemeSwitch() {
  const id = useId();
  const theme = useSyncExternalStore(subscribe, readTheme, () => "system" as const);
  return (
    <span className="theme-switch">
      <label htmlFor={id}>
        {themeWords.label}
        <select id={id} value={theme} onChange={(event) => chooseTheme(event.target.value)}>
          {themes.map((each) => (
            <option key={each} value={each}>
              {themeWords[each]}
            </option>
          ))}
        </select>
      </label>
    </span>
  );
}

const listeners = new Set<() => void>();

/** Other tabs tell through the storage event, this one through the set. */
function subscribe(listener: () => void): () => void {
  const onStorage = (event: StorageEvent) => {
    if (event.key !== themeStorageKey) return;
    applyTheme(readStored());
    listener();
  };
  listeners.add(listener);
  window.addEventListener("storage", onStorage);
  return () => {
    listeners.delete(listener);
    window.removeEventListener("storage", onStorage);
  };
}

/** The page's own attribute is the truth: storage may be refused. */
function readTheme(): Theme {
  const chosen = document.documentElement.dataset.theme ?? null;
  return isTheme(chosen) ? chosen : "system";
}

function readStored(): Theme {
  try {
    const stored = localStorage.getItem(themeStorageKey);
    return isTheme(stored) ? stored : "system";
  } catch {
    return "system";
  }
}

function chooseTheme(choice: string): void {
  const theme = isTheme(choice) ? choice : "system";
  applyTheme(theme);
  try {
    if (theme === "system") localStorage.removeItem(themeStorageKey);
    else localStorage.setItem(themeStorageKey, theme);
  } catch {
    // Storage refused: the choice holds for this page.
  }
  for (const listener of listeners) listener();
}

function applyTheme(theme: Theme): void {
  if (theme === "system") delete document.documentElement.dataset.theme;
  else document.documentElement.dataset.theme = theme;
}
