import type { Metadata } from "next";
import { Link } from "@/app/_components/ui/link";
import { ControlChart, FiguresTable } from "@/app/_components/chart";
import { ButtonLink, EmptyState, Notice, PageHead } from "@/app/_components/ui";
import { forPage, pageCtx } from "@/lib/auth";
import { isDomainError } from "@/lib/errors";
import { longDate, midSentence } from "@/lib/scene/format";
import { dateInZone } from "@/lib/indicators/month";
import { chartQuery } from "@/lib/schemas/chart";
import { getChartPage, unitWords, type ChartPage as Page } from "@/lib/services/charts";
import { chartPageWords as words } from "@/lib/strings/charts";
import { addressOf, filled, type SearchParams } from "../../_components/search-params";
import { ChartAside } from "./_components/chart-aside";
import { ChartViews } from "./_components/chart-views";
import "../../_components/charts.css";

interface Props {
  params: Promise<{ ward: string; indicator: string }>;
  searchParams: Promise<SearchParams>;
}

export const metadata: Metadata = { title: words.charts };

/** One ward's indicator: chart, table, and what it shows in words. */
export default async function ChartPage({ params, searchParams }: Props) {
  const codes = await params;
  const { page, search, problem } = await readPage(codes, filled(await searchParams));
  const { view, data } = page;
  const { ward, indicator } = view.series;
  const path = `/charts/${ward.code}/${indicator.code}`;
  return (
    <>
      <PageHead
        crumbs={[
          { label: ward.name, href: `/charts?ward=${ward.code}` },
          { label: ward.division },
          { label: words.version(view.definition.number) },
        ]}
        title={words.title(indicator.name, ward.name)}
        subtitle={subtitleOf(page)}
        actions={
          <>
            <ChartViews path={path} search={search} by={view.query.by} />
            {page.canAnnotate ? <ButtonLink href="#note">{words.addNote}</ButtonLink> : null}
            {/* A file, not a page: fetched by the browser itself. */}
            <a
              className="btn"
              href={addressOf("/api/exports/tallies.csv", { ward: ward.code, indicator: indicator.code })}
            >
              {words.figuresAsCsv}
            </a>
          </>
        }
      />
      {problem ? (
        <Notice mark="fix" className="mb-3" title={words.cantShow}>
          {problem}
        </Notice>
      ) : null}
      <ViewNotices page={page} path={path} search={search} />
      <div className="chart-page">
        <div className="chart-main">
          {data.points.length === 0 ? (
            <EmptyState title={words.noMonths}>{words.noMonthsNote}</EmptyState>
          ) : (
            <>
              <ControlChart data={data} id="chart" monthLinks={monthLinks(page)} />
              <div className="table-scroll">
                <FiguresTable data={data} id="figures" />
              </div>
            </>
          )}
        </div>
        <ChartAside page={page} path={path} search={search} />
      </div>
    </>
  );
}

function subtitleOf({ view }: Page): string {
  const { numeratorLabel, denominatorLabel } = view.definition;
  const counted = words.subtitle(numeratorLabel, midSentence(denominatorLabel), unitWords(view));
  return `${counted} ${words.better[view.series.indicator.betterWhen]}`;
}

/** An address that asks for what can't be shown gets the plain chart and is told why. */
async function readPage(
  codes: { ward: string; indicator: string },
  search: Record<string, string>,
): Promise<{ page: Page; search: Record<string, string>; problem: string | null }> {
  const ctx = await pageCtx();
  const plain = () => forPage(getChartPage({ ctx, input: { ...chartQuery.parse({}), ...codes } }));
  const query = chartQuery.safeParse(search);
  if (!query.success) {
    return { page: await plain(), search: {}, problem: query.error.issues[0]?.message ?? null };
  }
  try {
    const page = await getChartPage({ ctx, input: { ...query.data, ...codes } });
    return { page, search, problem: null };
  } catch (error) {
    if (isDomainError(error, "invalid")) return { page: await plain(), search: {}, problem: error.message };
    return forPage(Promise.reject<never>(error as Error));
  }
}

function ViewNotices({ page, path, search }: { page: Page; path: string; search: Record<string, string> }) {
  const { query, asOf, timeZone } = page.view;
  return (
    <>
      {asOf ? (
        <Notice className="mb-3">
          {words.asKnownNotice(longDate(dateInZone(asOf, timeZone)))}{" "}
          <Link href={addressOf(path, search, { asOf: undefined })}>{words.today}</Link>
        </Notice>
      ) : null}
      {query.limits ? (
        <Notice className="mb-3">
          {words.viewOnly}{" "}
          <Link href={addressOf(path, search, { limits: undefined })}>{words.asSettled}</Link>
        </Notice>
      ) : null}
      {query.by === "quarter" ? <Notice className="mb-3">{words.quarterNotice}</Notice> : null}
    </>
  );
}

function monthLinks({ view }: Page): (string | null)[] | undefined {
  if (view.query.by === "quarter") return undefined;
  const { ward, indicator } = view.series;
  return view.points.map((point) =>
    point.state === "missing" ? null : `/returns/${ward.code}/${point.month}/${indicator.code}`,
  );
}
