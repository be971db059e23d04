"use client";

import { classNames, Mark } from "@/app/_components/ui";
import {
  formatCount,
  formatRate,
  longMonth,
  noFigure,
  perWords,
  shortMonth,
} from "@/lib/indicators/chart-format";
import type { EarlierFigures, TypedParts } from "@/lib/indicators/return-entry";
import type { Month } from "@/lib/indicators/month";
import type { TallyReply } from "@/lib/schemas/tally";
import { entryWords } from "@/lib/strings/returns";
import { CountBox } from "./count-box";
import { draftKey, type EntryState, type Part } from "./entry-state";
import type { EntryStore } from "./entry-store";
import { isOdd, labelOf, LineChecks, LineMore, usualOf } from "./line-checks";
import { lineStatus, type LineStatus } from "./line-status";
import { SmallRecord } from "./small-record";

export interface EntryLineProps {
  store: EntryStore;
  state: EntryState;
  line: TallyReply;
  /** The line in whose boxes a shared denominator is typed; the line itself where it isn't shared. */
  typedIn: TallyReply;
  months: readonly Month[];
  earlier: readonly EarlierFigures[];
  types: TypedParts;
  timeZone: string;
  onOtherAnswer: () => void;
}

/** One indicator: a row for the numerator, one for the denominator, earlier months, this month, words. */
export function EntryLine(props: EntryLineProps) {
  const { line, state, store, earlier, types } = props;
  const status = lineStatus(line, state.drafts);
  const checksId = `checks-${line.indicator}`;
  const checks = {
    id: checksId,
    store,
    line,
    drafts: state.drafts,
    status,
    earlier,
    savedAt: state.savedAt[line.indicator],
    timeZone: props.timeZone,
    types,
    onOtherAnswer: props.onOtherAnswer,
  };
  return (
    <tbody className="entry-line" role="rowgroup">
      <tr role="row">
        <th className="entry-name" scope="rowgroup" role="rowheader" rowSpan={2}>
          {line.name}
          <small>{perWords(line.per)}</small>
        </th>
        <PartCells {...props} part="numerator" status={status} checksId={checksId} />
        <td className="entry-rate worked-out" role="cell" rowSpan={2}>
          <span className="entry-phone-label">{entryWords.thisMonth} </span>
          {status.rate === null ? noFigure : formatRate(status.rate, line.per)}
          {!line.isMature && status.figures.numerator !== null ? (
            <small>{entryWords.soFar(formatCount(status.figures.numerator))}</small>
          ) : null}
        </td>
        <td className="entry-record" role="cell" rowSpan={2}>
          <SmallRecord earlier={earlier} rate={status.rate} />
        </td>
        <td className="entry-checks" role="cell">
          <LineChecks {...checks} />
        </td>
      </tr>
      <tr role="row">
        <PartCells {...props} part="denominator" status={status} checksId={checksId} />
        <td className="entry-more" role="cell">
          <LineMore {...checks} />
        </td>
      </tr>
    </tbody>
  );
}

type PartProps = EntryLineProps & { part: Part; status: LineStatus; checksId: string };

function PartCells(props: PartProps) {
  const { line, part, months, earlier } = props;
  const repeats = part === "denominator" && props.typedIn.indicator !== line.indicator;
  return (
    <>
      <th className={`entry-label entry-${part}`} scope="row" role="rowheader">
        {labelOf(line, part)}
      </th>
      {months.map((month, index) => {
        const figures = earlier[index];
        const count = figures?.[part] ?? null;
        return (
          <td
            className={classNames(
              "entry-past numeric",
              `entry-${part}`,
              `past-${months.length - index}`,
              repeats && "worked-out",
            )}
            role="cell"
            key={month}
          >
            {index === months.length - 1 ? (
              <span className="entry-phone-label">{shortMonth(month)} </span>
            ) : null}
            {count === null ? noFigure : formatCount(count)}
            {part === "numerator" && figures?.corrected ? (
              <>
                {" "}
                <Mark mark="corrected" size={12} alone />
              </>
            ) : null}
          </td>
        );
      })}
      <td className={`entry-now entry-${part}`} role="cell">
        <NowCell {...props} />
      </td>
    </>
  );
}

/** The open month's cell: a box, or what stands in its place. */
function NowCell({ store, state, line, typedIn, types, part, status, earlier, checksId }: PartProps) {
  const { wardReturn, drafts } = state;
  const value = line[part];
  const draft = drafts[draftKey(line.indicator, part)];
  const repeats = part === "denominator" && typedIn.indicator !== line.indicator;
  const mayType = types.line && (part === "denominator" || types.numerator);
  if (repeats) {
    return (
      <Instead
        value={value}
        words={value === null && line.awaited ? entryWords.awaited : entryWords.asLine(typedIn.name)}
        isItalic
      />
    );
  }
  if (!mayType) {
    const words = part === "numerator" && line.numeratorBy === "team" ? entryWords.countedBy(line.team) : "";
    return <Instead value={value} words={value === null ? entryWords.notCountedYet : words} />;
  }
  if (
    line.notCollected !== null &&
    draft === undefined &&
    (part === "numerator" || line.sharedDenominator === null)
  ) {
    return <Instead value={null} words={entryWords.notCollected} isItalic />;
  }
  const isAwaited = part === "denominator" && line.awaited !== null && draft === undefined;
  return (
    <>
      {isAwaited ? <Instead value={null} words={entryWords.awaited} isAwaited isItalic /> : null}
      <CountBox
        store={store}
        indicator={line.indicator}
        part={part}
        value={value}
        draft={draft}
        label={entryWords.box(line.name, labelOf(line, part), longMonth(wardReturn.month))}
        needsFixing={status.fix.includes(part) || (status.pair !== null && status.fix.length > 0)}
        isOdd={isOdd(usualOf(status, earlier, part))}
        describedBy={checksId}
      />
    </>
  );
}

interface InsteadProps {
  value: number | null;
  words: string;
  isItalic?: boolean;
  isAwaited?: boolean;
}

function Instead({ value, words, isItalic, isAwaited }: InsteadProps) {
  return (
    <span className={classNames("entry-instead", isItalic && "worked-out")}>
      <small>
        {isAwaited ? <Mark mark="awaited" size={13} /> : null} {words}
      </small>
      {value === null ? null : formatCount(value)}
    </span>
  );
}
