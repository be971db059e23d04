"use client";

import type { ReactNode } from "react";
import { Button, Mark } from "@/app/_components/ui";
import { formatCount, longDate } from "@/lib/indicators/chart-format";
import { clockTime, tableInstant } from "@/lib/indicators/return-dates";
import {
  usualCheck,
  type EarlierFigures,
  type TypedParts,
  type UsualCheck,
} from "@/lib/indicators/return-entry";
import type { TallyReply } from "@/lib/schemas/tally";
import type { MarkId } from "@/lib/strings/frame";
import { checkWords, missingWords } from "@/lib/strings/returns";
import { draftKey, parts, type Drafts, type Part } from "./entry-state";
import type { EntryStore } from "./entry-store";
import { saysSomething, type LineStatus } from "./line-status";

export interface LineChecksProps {
  id: string;
  store: EntryStore;
  line: TallyReply;
  drafts: Drafts;
  status: LineStatus;
  earlier: readonly EarlierFigures[];
  savedAt: string | undefined;
  timeZone: string;
  types: TypedParts;
  onOtherAnswer: () => void;
}

/** What needs fixing in a line, or how it stands. */
export function LineChecks(props: LineChecksProps) {
  return (
    <div className="line-checks" id={props.id} aria-live="polite">
      {problems(props)}
    </div>
  );
}

/** Beneath it: how the line compares, its note, and the way to other answers. It follows the line's last box. */
export function LineMore(props: LineChecksProps) {
  const { line, types, onOtherAnswer } = props;
  return (
    <div className="line-checks line-more">
      <Usual {...props} />
      {line.note ? <Says mark="note">{line.note}</Says> : null}
      {types.line ? (
        <Button
          look="text"
          className="line-other"
          aria-label={checkWords.otherAnswerFor(line.name)}
          onClick={onOtherAnswer}
        >
          {checkWords.otherAnswer}
        </Button>
      ) : null}
    </div>
  );
}

function Says({ mark, title, children }: { mark?: MarkId; title?: ReactNode; children?: ReactNode }) {
  return (
    <div className="mark-line">
      {mark ? <Mark mark={mark} /> : <span className="dash" aria-hidden="true" />}
      <div>
        {title ? <b>{title}</b> : null} {children}
      </div>
    </div>
  );
}

function problems({ store, line, drafts, status, savedAt, timeZone }: LineChecksProps): ReactNode {
  const { indicator } = line;
  if (status.pair !== null && status.fix.length > 0) {
    return (
      <Says mark="fix" title={<span className="text-over">{status.pair}</span>}>
        {checkWords.wrongWayRound}{" "}
        <Button look="text" onClick={() => store.swap(indicator)}>
          {checkWords.swap}
        </Button>
      </Says>
    );
  }
  const broken = status.fix[0];
  if (broken) {
    const message = drafts[draftKey(indicator, broken)]?.message ?? checkWords.wholeNumber;
    return <Says mark="fix" title={<span className="text-over">{message}</span>} />;
  }
  if (status.conflict.length > 0) return <TwoVersions {...{ store, line, drafts, status, timeZone }} />;
  if (status.unsaved.length > 0) return <Unsaved {...{ store, line, drafts, status }} />;
  return <Saved {...{ line, status, savedAt, timeZone }} />;
}

function Unsaved({
  store,
  line,
  drafts,
  status,
}: Pick<LineChecksProps, "store" | "line" | "drafts" | "status">) {
  const states = status.unsaved.map((part) => drafts[draftKey(line.indicator, part)]?.state);
  if (states.includes("failed")) {
    return (
      <Says mark="unsaved" title={checkWords.offline}>
        <Button look="text" onClick={() => store.saveAgain()}>
          {checkWords.saveAgain}
        </Button>
      </Says>
    );
  }
  return <Says mark="unsaved" title={states.includes("saving") ? checkWords.saving : checkWords.dirty} />;
}

type VersionsProps = Pick<LineChecksProps, "store" | "line" | "drafts" | "status" | "timeZone">;

function TwoVersions({ store, line, drafts, status, timeZone }: VersionsProps) {
  const part = status.conflict[0] ?? "numerator";
  const words = (value: string) => (value === "" ? checkWords.blank : value);
  const mine = words(drafts[draftKey(line.indicator, part)]?.text ?? "");
  const theirs = words(line[part] === null ? "" : formatCount(line[part]));
  const isDenominator = part === "denominator";
  const name = (isDenominator ? line.denominatorSavedBy : line.savedBy) ?? "";
  const at = (isDenominator ? line.denominatorSavedAt : line.savedAt) ?? "";
  return (
    <Says mark="conflict" title={checkWords.twoVersions(labelOf(line, part))}>
      {checkWords.mineAndTheirs(mine, name, at === "" ? "" : clockTime(at, timeZone), theirs)}{" "}
      <Button look="text" onClick={() => store.keepMine(line.indicator)}>
        {checkWords.keep(mine)}
      </Button>
      <Button look="text" onClick={() => store.useTheirs(line.indicator)}>
        {checkWords.use(theirs)}
      </Button>
    </Says>
  );
}

function Saved({
  line,
  status,
  savedAt,
  timeZone,
}: Pick<LineChecksProps, "line" | "status" | "savedAt" | "timeZone">) {
  const labels = { numerator: line.numeratorLabel, denominator: line.denominatorLabel };
  const team = line.numeratorBy === "team" ? checkWords.countedByTeam(line.numeratorLabel, line.team) : null;
  if (status.missing !== null) return <Says title={missingWords.part(labels, status.missing)}>{team}</Says>;
  if (status.answer === "not-collected")
    return <Says title={checkWords.notCollected}>{line.notCollected}</Says>;
  if (status.answer === "awaited") {
    const title = checkWords.awaitedFrom(line.denominatorLabel, line.awaited ?? "");
    return (
      <Says mark="awaited" title={title}>
        {checkWords.awaitedNote}
      </Says>
    );
  }
  if (!line.isMature) {
    return (
      <Says mark="ripening" title={checkWords.ripening}>
        {checkWords.ripeningUntil(longDate(line.matureOn))}
      </Says>
    );
  }
  if (!saysSomething(line)) return <Says>{team ?? missingWords.part(labels, "line")}</Says>;
  const before =
    line.savedAt === null ? checkWords.saved : checkWords.savedAt(tableInstant(line.savedAt, timeZone));
  return (
    <Says mark="saved" title={savedAt ? checkWords.savedAt(clockTime(savedAt, timeZone)) : before}>
      {status.answer === "nothing-to-count" ? checkWords.nothingToCount : null}
    </Says>
  );
}

export const labelOf = (line: TallyReply, part: Part): string =>
  part === "numerator" ? line.numeratorLabel : line.denominatorLabel;

/** How a box compares with the earlier months; null where it is blank or they are too few. */
export function usualOf(
  status: LineStatus,
  earlier: readonly EarlierFigures[],
  part: Part,
): UsualCheck | null {
  if (status.pair !== null) return null;
  return usualCheck(
    status.figures[part],
    earlier.map((each) => each[part]),
  );
}

export const isOdd = (check: UsualCheck | null): boolean => check?.verdict.startsWith("well") === true;

/** One sentence for the numerator, and one for the denominator where that is odd. */
function Usual({ line, status, earlier, types, onOtherAnswer }: LineChecksProps) {
  // A count that somebody else types is theirs to check.
  const own = parts.filter((part) => part === "denominator" || types.numerator);
  const says = own.flatMap((part) => {
    const check = usualOf(status, earlier, part);
    const isSaid = check !== null && (part === "numerator" || isOdd(check));
    return isSaid ? [{ part, check, value: status.figures[part] ?? 0 }] : [];
  });
  return says.map(({ part, check, value }) => (
    <p className="usual" key={part}>
      {usualWords(check, labelOf(line, part), formatCount(value))}
      {isOdd(check) && types.line ? (
        <>
          {" "}
          <Button look="text" onClick={onOtherAnswer}>
            {checkWords.sayWhy}
          </Button>
        </>
      ) : null}
    </p>
  ));
}

function usualWords({ verdict, range }: UsualCheck, label: string, value: string): string {
  const [least, most] = [formatCount(range.least), formatCount(range.most)];
  switch (verdict) {
    case "within":
      return checkWords.within(least, most);
    case "above":
      return checkWords.above(label, least, most);
    case "below":
      return checkWords.below(label, least, most);
    case "well-above":
      return checkWords.wellAbove(value, least, most);
    case "well-below":
      return checkWords.wellBelow(value, least, most);
  }
}
