"use client";

import { longMonth, shortMonth } from "@/lib/indicators/chart-format";
import type { Month } from "@/lib/indicators/month";
import { monthAlone } from "@/lib/indicators/return-dates";
import type { EarlierFigures, TypedParts } from "@/lib/indicators/return-entry";
import { entryWords } from "@/lib/strings/returns";
import { EntryLine } from "./entry-line";
import { typedIn, type EntryState } from "./entry-state";
import type { EntryStore } from "./entry-store";

interface EntryGridProps {
  store: EntryStore;
  state: EntryState;
  months: readonly Month[];
  earlier: Readonly<Record<string, readonly EarlierFigures[]>>;
  types: Readonly<Record<string, TypedParts>>;
  timeZone: string;
  onOtherAnswer: (indicator: string) => void;
}

/** A real table on wide pages; on phones one block an indicator, its roles named because the layout drops them. */
export function EntryGrid({ store, state, months, earlier, types, timeZone, onOtherAnswer }: EntryGridProps) {
  const { wardReturn } = state;
  const none = months.map(() => ({ numerator: null, denominator: null, corrected: false }));
  return (
    <>
      <table className="entry-grid" role="table">
        <caption className="sr-only">
          {entryWords.caption(wardReturn.wardName, months.length, longMonth(wardReturn.month))}
        </caption>
        <EntryHead months={months} month={wardReturn.month} />
        {wardReturn.tallies.map((line) => (
          <EntryLine
            key={line.indicator}
            store={store}
            state={state}
            line={line}
            typedIn={typedIn(line, wardReturn.tallies)}
            months={months}
            earlier={earlier[line.indicator] ?? none}
            types={types[line.indicator] ?? { numerator: false, line: false }}
            timeZone={timeZone}
            onOtherAnswer={() => onOtherAnswer(line.indicator)}
          />
        ))}
      </table>
      <p className="entry-keys">
        <b>{entryWords.keys}</b>
        <span>
          <kbd>Enter</kbd> {entryWords.keyNext}
        </span>
        <span>
          <kbd>Tab</kbd> {entryWords.keyTab}
        </span>
        <span>
          <kbd>Esc</kbd> {entryWords.keyBack}
        </span>
        <span className="entry-saves">{entryWords.eachSaves}</span>
      </p>
      <p className="care entry-care">{entryWords.care}</p>
    </>
  );
}

function EntryHead({ months, month }: { months: readonly Month[]; month: Month }) {
  return (
    <thead role="rowgroup">
      <tr role="row">
        <th scope="col" role="columnheader">
          {entryWords.indicator}
        </th>
        <th scope="col" role="columnheader">
          {entryWords.count}
        </th>
        {months.map((each, index) => (
          <th className={`numeric past-${months.length - index}`} scope="col" role="columnheader" key={each}>
            {shortMonth(each)}
            {index === 0 || each.endsWith("-01") ? <small>{each.slice(0, 4)}</small> : null}
          </th>
        ))}
        <th className="entry-now numeric" scope="col" role="columnheader">
          {monthAlone(month)}
          <small>{entryWords.openState}</small>
        </th>
        <th className="entry-rate" scope="col" role="columnheader">
          {entryWords.thisMonth}
        </th>
        <th className="entry-record" scope="col" role="columnheader">
          {entryWords.earlierMonths}
        </th>
        <th scope="col" role="columnheader">
          {entryWords.checks}
        </th>
      </tr>
    </thead>
  );
}
