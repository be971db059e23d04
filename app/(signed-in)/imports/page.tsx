import type { Metadata } from "next";
import { PageHead } from "@/app/_components/ui";
import { forPage, pageCtx } from "@/lib/auth";
import { addMonths, monthInZone, monthRange } from "@/lib/indicators/month";
import { getHospital } from "@/lib/services/hospital";
import { listImports } from "@/lib/services/imports";
import { listWards } from "@/lib/services/wards";
import { importPageWords as say } from "@/lib/strings/imports";
import { History } from "./_components/history";
import { GetTemplate, TakeOut } from "./_components/sheets-to-get";
import { UploadForm } from "./_components/upload-form";
import "./imports.css";

export const metadata: Metadata = { title: say.title };

interface Props {
  searchParams: Promise<Record<string, string | string[] | undefined>>;
}

/** Months that the template can be had for here; the API gives it for any. */
const TEMPLATE_MONTHS = 12;

/** Choosing a file, the template, and the files so far. */
export default async function ImportsPage({ searchParams }: Props) {
  const { cursor } = await searchParams;
  const ctx = await pageCtx();
  const history = await forPage(
    listImports({ ctx, input: { cursor: typeof cursor === "string" ? cursor : undefined } }),
  );
  const wards = await forPage(listWards({ ctx }));
  const { timeZone } = await forPage(getHospital({ ctx }));
  const thisMonth = monthInZone(ctx.now, timeZone);
  const months = monthRange(addMonths(thisMonth, 1 - TEMPLATE_MONTHS), thisMonth).toReversed();
  return (
    <>
      <PageHead
        crumbs={[{ label: say.returns, href: "/returns" }, { label: say.title }]}
        title={say.title}
        subtitle={say.subtitle}
      />
      <div className="import-page">
        <div>
          <UploadForm />
          <History items={history.items} nextCursor={history.nextCursor} timeZone={timeZone} />
        </div>
        <aside>
          <GetTemplate wards={wards.map(({ code, name }) => ({ code, name }))} months={months} />
          <TakeOut />
        </aside>
      </div>
    </>
  );
}
