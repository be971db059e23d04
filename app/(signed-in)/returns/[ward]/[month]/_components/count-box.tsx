"use client";

import type { KeyboardEvent } from "react";
import { classNames } from "@/app/_components/ui";
import { formatCount } from "@/lib/indicators/chart-format";
import { draftKey, type Draft, type Part } from "./entry-state";
import type { EntryStore } from "./entry-store";
import { boxId } from "./line-status";

interface CountBoxProps {
  store: EntryStore;
  indicator: string;
  part: Part;
  value: number | null;
  draft: Draft | undefined;
  label: string;
  needsFixing: boolean;
  isOdd: boolean;
  /** Id of the words about this line. */
  describedBy: string;
}

/** One count. It saves on leaving; Enter goes to the next box of the column, Escape puts the saved value back. */
export function CountBox(props: CountBoxProps) {
  const { store, indicator, part, value, draft, needsFixing, isOdd } = props;
  const saved = value === null ? "" : formatCount(value);
  const isConflict = draft?.state === "conflict";
  return (
    <input
      className={classNames(
        "count-box",
        isConflict && "count-box-fix",
        isOdd && !needsFixing && "count-box-check",
      )}
      id={boxId(indicator, part)}
      name={draftKey(indicator, part)}
      type="text"
      inputMode="numeric"
      autoComplete="off"
      enterKeyHint="next"
      data-box=""
      aria-label={props.label}
      aria-describedby={props.describedBy}
      aria-invalid={needsFixing || isConflict || undefined}
      value={draft?.text ?? saved}
      onChange={(event) => store.type(indicator, part, event.target.value)}
      onFocus={(event) => event.target.select()}
      onBlur={() => store.leave(indicator, part)}
      onKeyDown={(event) => {
        if (event.key === "Escape") store.putBack(indicator, part);
        if (event.key === "Enter") goToNext(event);
      }}
    />
  );
}

function goToNext(event: KeyboardEvent<HTMLInputElement>): void {
  event.preventDefault();
  const boxes = [...document.querySelectorAll<HTMLInputElement>("input[data-box]")];
  const next = boxes[boxes.indexOf(event.currentTarget) + (event.shiftKey ? -1 : 1)];
  if (next) next.focus();
  else event.currentTarget.blur();
}
