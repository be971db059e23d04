import { ControlChart } from "@/app/_components/chart";
import { Cell, DataTable, HeadCell, Mark, SectionHead } from "@/app/_components/ui";
import type { SignalWords } from "@/lib/indicators/signal-words";
import { formatCount, formatRate } from "@/lib/scene/format";
import type { LimitsForMonth, PreviewCharts } from "@/lib/services/charts";
import { baselineWords as words } from "@/lib/strings/charts";

interface PreviewPairProps {
  preview: PreviewCharts;
  per: number;
}

const size = { width: 640, plotHeight: 240 };

/** A draft's chart before and after, the signals that come and go, and limits at usual denominators. */
export function PreviewPair({ preview, per }: PreviewPairProps) {
  return (
    <>
      <div className="preview-pair">
        <PreviewChart title={words.before} id="before" side={preview.before} />
        <PreviewChart title={words.after} id="after" side={preview.after} />
      </div>
      <div className="baseline-columns">
        <ComeAndGo preview={preview} />
        <LimitsTable preview={preview} per={per} />
      </div>
    </>
  );
}

function PreviewChart({ title, id, side }: { title: string; id: string; side: PreviewCharts["before"] }) {
  return (
    <section className="chart-main">
      <h2>
        {title}
        {side.summary ? <small>{side.summary}</small> : null}
      </h2>
      <ControlChart data={side.data} id={id} options={size} withKey={false} />
    </section>
  );
}

function ComeAndGo({ preview }: { preview: PreviewCharts }) {
  return (
    <section>
      <SectionHead>{words.comeAndGo}</SectionHead>
      <ul className="ruled-list chart-aside">
        {preview.go.map((signal) => (
          <SignalLine
            key={lineKey(signal)}
            signal={signal}
            lead={words.goes(signal.what)}
            note={words.goesNote}
          />
        ))}
        {preview.change.map((signal) => (
          <SignalLine key={lineKey(signal)} signal={signal} lead={words.changes(signal.what)} note={null} />
        ))}
        {preview.come.map((signal) => (
          <SignalLine key={lineKey(signal)} signal={signal} lead={words.comes(signal.what)} note={null} />
        ))}
        {preview.go.length === 0 ? <li>{words.noneGoes}</li> : null}
        {preview.come.length === 0 ? <li>{words.noneComes}</li> : null}
      </ul>
    </section>
  );
}

const lineKey = (signal: SignalWords) => `${signal.what} ${signal.months}`;

function SignalLine({ signal, lead, note }: { signal: SignalWords; lead: string; note: string | null }) {
  return (
    <li className="shown">
      <Mark mark={signal.mark} size={15} />
      <div>
        <b>{lead}</b> {signal.months}. {note}
      </div>
    </li>
  );
}

function LimitsTable({ preview, per }: PreviewPairProps) {
  return (
    <DataTable caption={words.limitsFor} look="tight">
      <thead>
        <tr>
          <HeadCell numeric>{preview.after.data.denominatorLabel}</HeadCell>
          <HeadCell numeric>{words.before}</HeadCell>
          <HeadCell numeric>{words.after}</HeadCell>
          <HeadCell numeric>{words.stoodOut}</HeadCell>
          <HeadCell numeric>{words.wouldStandOut}</HeadCell>
        </tr>
      </thead>
      <tbody>
        {preview.rows.map((row) => (
          <tr key={row.denominator}>
            <th scope="row" className="numeric">
              {formatCount(row.denominator)}
            </th>
            <Cell numeric workedOut>
              {limitsText(row.before, per)}
            </Cell>
            <Cell numeric workedOut>
              {limitsText(row.after, per)}
            </Cell>
            <Cell numeric workedOut>
              {standsOut(row.before)}
            </Cell>
            <Cell numeric workedOut>
              {standsOut(row.after)}
            </Cell>
          </tr>
        ))}
      </tbody>
    </DataTable>
  );
}

function limitsText({ limits }: LimitsForMonth, per: number): string {
  if (limits === null) return words.none;
  const lower = limits.lower <= 0 ? words.none : formatRate(limits.lower, per);
  return words.range(lower, formatRate(limits.upper, per));
}

function standsOut({ standsOutAt }: LimitsForMonth): string {
  return standsOutAt === null ? words.noCount : words.orMore(formatCount(standsOutAt));
}
