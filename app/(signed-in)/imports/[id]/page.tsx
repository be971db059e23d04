import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { ButtonLink, PageHead, Tabs } from "@/app/_components/ui";
import { forPage, pageCtx } from "@/lib/auth";
import { can } from "@/lib/policy";
import { importParams, importRowsQuery, type ImportReply } from "@/lib/schemas/import";
import { getImport, listImportRows } from "@/lib/services/imports";
import { checkPageWords as say, importPageWords } from "@/lib/strings/imports";
import "../imports.css";
import { AfterPanel } from "./_components/after-panel";
import { BeforePanel } from "./_components/before-panel";
import { ColumnsRead, Sums } from "./_components/columns-read";
import { RowsTable } from "./_components/rows-table";

export const metadata: Metadata = { title: say.titles.checked };

interface Props {
  params: Promise<{ id: string }>;
  searchParams: Promise<Record<string, string | string[] | undefined>>;
}

/** What each row of a checked sheet will do, and the way to bring it in. */
export default async function ImportPage({ params, searchParams }: Props) {
  const ctx = await pageCtx();
  const parsed = importParams.safeParse(await params);
  if (!parsed.success) notFound();
  const { id } = parsed.data;
  const asked = importRowsQuery.safeParse(await searchParams);
  const { show, cursor } = asked.success ? asked.data : {};
  const run = await forPage(getImport({ ctx, input: { id, limit: 1 } }));
  const page = await forPage(listImportRows({ ctx, input: { id, show, cursor } }));
  const { counts } = run;
  const all = counts.new + counts.changed + counts.same + counts.rejected;
  return (
    <>
      <PageHead
        crumbs={[
          { label: importPageWords.returns, href: "/returns" },
          { label: say.steps, href: "/imports" },
          { label: run.fileName },
        ]}
        title={say.titles[run.state]}
        subtitle={
          <>
            <b>{run.fileName}</b>
            {say.subtitle(run.sheetName, all)} {run.state === "checked" ? say.nothingSaved : null}
          </>
        }
        actions={<ButtonLink href="/imports">{say.another}</ButtonLink>}
      />
      <div className="import-page">
        <section>
          <Tabs label={say.tabsLabel} items={tabsOf(run, all, show)} />
          <RowsTable rows={page.rows} />
          {page.nextCursor ? (
            <p className="mt-3">
              <ButtonLink href={`/imports/${id}?${show ? `show=${show}&` : ""}cursor=${page.nextCursor}`}>
                {say.further}
              </ButtonLink>
            </p>
          ) : null}
        </section>
        <aside>
          {run.state === "checked" ? (
            <BeforePanel run={run} mayAccept={can(ctx.actor, "import.accept")} />
          ) : (
            <AfterPanel run={run} />
          )}
          <Sums totals={run.totals} />
          <ColumnsRead columns={run.columns} />
          <p className="hint">{say.allOrNothing}</p>
        </aside>
      </div>
    </>
  );
}

const shown = ["rejected", "changed", "new", "same"] as const;

function tabsOf({ id, counts }: ImportReply, all: number, current: string | undefined) {
  return [
    { href: `/imports/${id}`, label: say.tabs.all, count: all, current: current === undefined },
    ...shown.map((outcome) => ({
      href: `/imports/${id}?show=${outcome}`,
      label: say.tabs[outcome],
      count: counts[outcome],
      current: current === outcome,
    })),
  ];
}
