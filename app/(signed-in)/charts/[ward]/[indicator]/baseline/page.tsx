import type { Metadata } from "next";
import { ButtonLink, Notice, PageHead, SectionHead } from "@/app/_components/ui";
import { forPage, pageCtx } from "@/lib/auth";
import { isDomainError } from "@/lib/errors";
import { longDate, longMonth } from "@/lib/scene/format";
import { previewBaselineQuery } from "@/lib/schemas/baseline";
import { chartQuery } from "@/lib/schemas/chart";
import { getBaselinePage, type BaselineItem } from "@/lib/services/baselines";
import { getChartPage, getPreviewCharts, type PreviewCharts } from "@/lib/services/charts";
import { baselineWords as words, chartPageWords } from "@/lib/strings/charts";
import { filled, type SearchParams } from "../../../_components/search-params";
import { BaselineForm } from "./_components/baseline-form";
import { BaselineHistory } from "./_components/baseline-history";
import { DecideForm } from "./_components/decide-form";
import { PreviewPair } from "./_components/preview-pair";
import "../../../_components/charts.css";

interface Props {
  params: Promise<{ ward: string; indicator: string }>;
  searchParams: Promise<SearchParams>;
}

export const metadata: Metadata = { title: words.title };

/** The baselines of one chart: what holds, what waits, what a draft would change. */
export default async function BaselinePage({ params, searchParams }: Props) {
  const codes = await params;
  const ctx = await pageCtx();
  const { series, items, mode } = await forPage(getBaselinePage({ ctx, input: codes }));
  const chart = await forPage(getChartPage({ ctx, input: { ...codes, ...chartQuery.parse({}) } }));
  const waiting = items.find((item) => item.state === "proposed");
  const search = filled(await searchParams);
  const shown = search.from ? search : waiting ? addressValues(waiting) : null;
  const { preview, problem } = await readPreview(codes, shown);
  const months = chart.view.allMonths.map((each) => each.month);
  const path = `/charts/${series.ward.code}/${series.indicator.code}`;
  const title = chartPageWords.title(series.indicator.name, series.ward.name);
  return (
    <>
      <PageHead
        crumbs={[
          { label: series.ward.name, href: `/charts?ward=${series.ward.code}` },
          { label: series.indicator.name, href: path },
        ]}
        title={words.title}
        subtitle={`${title}. ${words.subtitle}`}
        actions={<ButtonLink href={path}>{words.backToChart}</ButtonLink>}
      />
      {problem ? (
        <Notice mark="fix" className="mb-3">
          {problem}
        </Notice>
      ) : null}
      {preview ? <PreviewPair preview={preview} per={series.indicator.per} /> : null}
      <div className="baseline-columns">
        <div>
          {waiting ? <Waiting item={waiting} codes={codes} /> : null}
          {mode ? (
            <BaselineForm
              ward={series.ward.code}
              indicator={series.indicator.code}
              mode={mode}
              months={{ first: months[0], last: months.at(-1) }}
            />
          ) : (
            <p>{words.noForm}</p>
          )}
        </div>
        <div>
          <SectionHead>{words.limitsNow}</SectionHead>
          <ul className="ruled-list mb-3">
            {chart.limits.map((sentence) => (
              <li key={sentence}>{sentence}</li>
            ))}
          </ul>
          <SectionHead>{words.needs}</SectionHead>
          <ul className="ruled-list">
            {words.needsList.map((need) => (
              <li key={need}>{need}</li>
            ))}
          </ul>
        </div>
      </div>
      <BaselineHistory items={items} per={series.indicator.per} />
      <p className="care">{words.packsNote}</p>
    </>
  );
}

function Waiting({ item, codes }: { item: BaselineItem; codes: { ward: string; indicator: string } }) {
  return (
    <section className="panel mb-3">
      <SectionHead>{words.waiting}</SectionHead>
      <Proposal item={item} />
      {item.canDecide ? (
        <DecideForm ward={codes.ward} indicator={codes.indicator} id={item.id} version={item.version} />
      ) : (
        <p className="mt-2">{words.otherDecides}</p>
      )}
    </section>
  );
}

function Proposal({ item }: { item: BaselineItem }) {
  const months = words.range(longMonth(item.from), longMonth(item.to));
  return (
    <>
      <p>
        <b>{words.draft(months, item.appliesFrom && longMonth(item.appliesFrom))}</b>
      </p>
      <p>{item.reason}</p>
      <p className="hint">{words.proposedBy(item.proposedBy, longDate(item.proposedAt.slice(0, 10)))}</p>
    </>
  );
}

function addressValues(item: BaselineItem): Record<string, string> {
  return {
    from: item.from,
    to: item.to,
    ...(item.appliesFrom ? { appliesFrom: item.appliesFrom } : {}),
    leftOut: item.leftOut.map((each) => each.month).join(","),
  };
}

/** What a draft would change, or why it can't be. */
async function readPreview(
  codes: { ward: string; indicator: string },
  values: Record<string, string> | null,
): Promise<{ preview: PreviewCharts | null; problem: string | null }> {
  if (values === null) return { preview: null, problem: null };
  const draft = previewBaselineQuery.safeParse(values);
  if (!draft.success) return { preview: null, problem: draft.error.issues[0]?.message ?? null };
  try {
    const ctx = await pageCtx();
    return { preview: await getPreviewCharts({ ctx, input: { ...draft.data, ...codes } }), problem: null };
  } catch (error) {
    if (isDomainError(error, "invalid")) return { preview: null, problem: error.message };
    throw error;
  }
}
