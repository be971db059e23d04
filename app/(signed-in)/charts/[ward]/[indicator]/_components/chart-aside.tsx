import { Link } from "@/app/_components/ui/link";
import { Mark, SectionHead } from "@/app/_components/ui";
import { monthRange } from "@/lib/indicators/month";
import { longMonth } from "@/lib/scene/format";
import type { ChartPage } from "@/lib/services/charts";
import { chartPageWords as words, limitMethodWords } from "@/lib/strings/charts";
import { detectionSentences } from "@/lib/strings/detection";
import { addressOf } from "../../../_components/search-params";
import { AddNote } from "./add-note";
import { ViewForm } from "./view-form";

interface ChartAsideProps {
  page: ChartPage;
  path: string;
  search: Record<string, string>;
}

/** The chart in words, and the ways on from it. The caution stands in the foot of every page. */
export function ChartAside({ page, path, search }: ChartAsideProps) {
  const { ward, indicator } = page.view.series;
  return (
    <aside className="chart-aside">
      <Shows page={page} />
      <Detection page={page} />
      {page.limits.length > 0 ? (
        <section>
          <SectionHead>{words.limitsInUse}</SectionHead>
          <ul className="ruled-list">
            {page.limits.map((sentence) => (
              <li key={sentence}>{sentence}</li>
            ))}
          </ul>
        </section>
      ) : null}
      <section className="not-printed">
        <SectionHead>{words.more}</SectionHead>
        <ul className="link-pairs">
          <li>
            <Link href={`${path}/baseline`}>{words.baseline}</Link>
          </li>
          <li>
            <Link href={addressOf("/signals", { ward: ward.code, indicator: indicator.code })}>
              {words.signalsHere}
            </Link>
          </li>
          <li>
            <Link href={`/charts?ward=${ward.code}`}>{words.thisWard}</Link>
          </li>
        </ul>
        <LimitViews path={path} search={search} current={page.view.query.limits} />
        <ViewForm path={path} search={search} />
      </section>
      {page.canAnnotate ? <NoteSection page={page} /> : null}
    </aside>
  );
}

function Shows({ page }: { page: ChartPage }) {
  return (
    <section>
      <SectionHead>{words.shows}</SectionHead>
      <ul className="ruled-list">
        {page.quiet ? <li>{page.quiet}</li> : null}
        {page.shows.map((shown) => (
          <li key={shown.key} className="shown">
            <Mark mark={shown.mark} size={15} />
            <div>
              <b>{shown.lead}</b> {shown.text}
              {shown.small ? <small>{shown.small}</small> : null}
            </div>
          </li>
        ))}
        {page.quiet === null && page.shows.length === 0 ? <li>{words.nothing}</li> : null}
      </ul>
    </section>
  );
}

function Detection({ page }: { page: ChartPage }) {
  const { detection } = page;
  if (detection === null) return null;
  return (
    <section>
      <SectionHead>
        <Mark mark="shallow" size={15} /> {detectionSentences.panel}
      </SectionHead>
      <p className="mt-2 text-[0.9rem]">
        <b>{detection.title}:</b> {detection.months} {detection.sentences.join(" ")}
      </p>
    </section>
  );
}

/** Other limits for viewing, as links. */
function LimitViews({
  path,
  search,
  current,
}: Omit<ChartAsideProps, "page"> & { current: string | undefined }) {
  const methods = ["three-sigma", "exact", "overdispersed"] as const;
  const choices = [undefined, ...methods].filter((choice) => choice !== current);
  return (
    <p className="mt-3 text-[0.9rem]">
      {words.limitViews}:{" "}
      {choices.map((choice, index) => (
        <span key={choice ?? "settled"}>
          {index > 0 ? ", " : ""}
          <Link href={addressOf(path, search, { limits: choice })}>
            {choice === undefined ? words.asSettled : limitMethodWords[choice]}
          </Link>
        </span>
      ))}
    </p>
  );
}

function NoteSection({ page }: { page: ChartPage }) {
  const { ward, indicator } = page.view.series;
  const first = page.view.months[0]?.month;
  const last = page.view.months.at(-1)?.month;
  if (first === undefined || last === undefined) return null;
  const months = monthRange(first, last)
    .reverse()
    .map((month) => ({ value: month, label: longMonth(month) }));
  return (
    <section className="not-printed" id="note">
      <SectionHead>{words.addNote}</SectionHead>
      <AddNote ward={ward.code} indicator={indicator.code} months={months} />
    </section>
  );
}
