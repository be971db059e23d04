"use client";

import { Button, Notice } from "@/app/_components/ui";
import { formWords } from "@/lib/strings/set-up";
import type { SavedRecord } from "./use-sending";

interface TwoVersionsProps {
  /** Field names and what they are called on the page, in the page's order. */
  labels: Readonly<Record<string, string>>;
  mine: SavedRecord;
  theirs: SavedRecord;
  onKeepMine: () => void;
  onUseTheirs: () => void;
}

/** Both values of each field that differs, side by side, and the choice between them. */
export function TwoVersions({ labels, mine, theirs, onKeepMine, onUseTheirs }: TwoVersionsProps) {
  const different = Object.entries(labels).filter(([name]) => inWords(mine[name]) !== inWords(theirs[name]));
  return (
    <Notice mark="conflict" live="alert" className="mb-3" title={formWords.staleTitle}>
      {formWords.stale}
      <ul>
        {different.map(([name, label]) => (
          <li key={name}>{formWords.staleLine(label, inWords(mine[name]), inWords(theirs[name]))}</li>
        ))}
      </ul>
      <div className="actions mt-2">
        <Button onClick={onKeepMine}>{formWords.keepMine}</Button>
        <Button onClick={onUseTheirs}>{formWords.useTheirs}</Button>
      </div>
    </Notice>
  );
}

/** A value as the reader sees it; forms hold numbers as text, so both sides are compared in words. */
function inWords(value: unknown): string {
  if (value === null || value === undefined || value === "") return formWords.nothing;
  if (typeof value === "boolean") return value ? formWords.yes : formWords.no;
  return typeof value === "string" ? value : JSON.stringify(value);
}
