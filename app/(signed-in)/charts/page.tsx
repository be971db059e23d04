import type { Metadata } from "next";
import { Button, EmptyState, PageHead, Select } from "@/app/_components/ui";
import { forPage, pageCtx } from "@/lib/auth";
import { listCharts, type ListedChart } from "@/lib/services/charts";
import { listWards } from "@/lib/services/wards";
import { chartIndexWords as words } from "@/lib/strings/charts";
import { oneOf, type SearchParams } from "./_components/search-params";
import { WardCharts } from "./_components/ward-charts";
import "./_components/charts.css";

export const metadata: Metadata = { title: words.title };

/** Every chart in scope, by ward and indicator; `?ward=` keeps to one ward. */
export default async function ChartsPage({ searchParams }: { searchParams: Promise<SearchParams> }) {
  const ctx = await pageCtx();
  const ward = oneOf((await searchParams).ward);
  const charts = await forPage(listCharts({ ctx, input: { ward } }));
  const wards = await forPage(listWards({ ctx }));
  return (
    <>
      <PageHead title={words.title} subtitle={words.subtitle} />
      {wards.length > 1 ? (
        <form className="view-form mb-3" method="get">
          <Select id="ward" name="ward" label={words.ward} defaultValue={ward?.toUpperCase() ?? ""} inline>
            <option value="">{words.allWards}</option>
            {wards.map((each) => (
              <option key={each.code} value={each.code}>
                {each.name}
              </option>
            ))}
          </Select>
          <Button type="submit">{words.filter}</Button>
        </form>
      ) : null}
      {charts.length === 0 ? <EmptyState title={words.none} /> : null}
      {byWard(charts).map((list) => (
        <WardCharts key={list[0]?.ward.code} charts={list} />
      ))}
    </>
  );
}

/** The list comes in the order of wards. */
function byWard(charts: readonly ListedChart[]): ListedChart[][] {
  const lists: ListedChart[][] = [];
  for (const chart of charts) {
    const open = lists.at(-1);
    if (open?.[0]?.ward.code === chart.ward.code) open.push(chart);
    else lists.push([chart]);
  }
  return lists;
}
