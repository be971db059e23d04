"use client";

import { Mark } from "@/app/_components/ui";
import type { TallyReply } from "@/lib/schemas/tally";
import { entryWords, holdWords, returnChangeWords } from "@/lib/strings/returns";
import type { Part } from "./entry-state";
import { boxId, type Hold } from "./line-status";

export interface HeldLine {
  line: TallyReply;
  why: Hold;
  part: Part;
}

interface SendReasonsProps {
  held: readonly HeldLine[];
  maySend: boolean;
  /** False while the month is running. */
  isOver: boolean;
}

/** What keeps the return from being sent, each with a link to its box; or that nothing does. */
export function SendReasons({ held, maySend, isOver }: SendReasonsProps) {
  if (!maySend) return <p className="send-reasons">{entryWords.notYours}</p>;
  if (!isOver) return <p className="send-reasons">{returnChangeWords.monthNotOver}</p>;
  if (held.length === 0) {
    return (
      <p className="send-reasons">
        <Mark mark="saved" /> {entryWords.canSend}
      </p>
    );
  }
  return (
    <div className="send-reasons mark-line">
      <Mark mark={held.some((each) => each.why === "fix" || each.why === "conflict") ? "fix" : "unsaved"} />
      <p>
        {entryWords.cantSend}{" "}
        {held.map(({ line, why, part }, index) => (
          <span key={line.indicator}>
            {index > 0 ? ", " : null}
            <a
              href={`#${boxId(line.indicator, part)}`}
              onClick={(event) => goToBox(event, boxId(line.indicator, part))}
            >
              {line.name}
            </a>{" "}
            ({holdWords[why]})
          </span>
        ))}
        .
      </p>
    </div>
  );
}

/** The box may stand under another's line (a shared denominator) or be hidden behind an answer: then the row. */
function goToBox(event: { preventDefault: () => void }, id: string): void {
  const box = document.getElementById(id);
  if (!box) return;
  event.preventDefault();
  box.focus();
  box.scrollIntoView({ block: "center" });
}
