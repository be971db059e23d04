import type { Metadata } from "next";
import { EmptyState, PageHead } from "@/app/_components/ui";
import { forPage, pageCtx } from "@/lib/auth";
import { returnListQuery } from "@/lib/schemas/ward-return";
import { getHospital } from "@/lib/services/hospital";
import { listReturns } from "@/lib/services/returns";
import { listWards } from "@/lib/services/wards";
import { addMonths, monthInZone, monthRange } from "@/lib/indicators/month";
import { returnListWords } from "@/lib/strings/returns";
import { ReturnFilter } from "./_components/return-filter";
import { ReturnTable } from "./_components/return-table";
import "./returns.css";

export const metadata: Metadata = { title: returnListWords.title };

interface Props {
  searchParams: Promise<Record<string, string | string[] | undefined>>;
}

/** The returns of the wards that one may see, the last twelve months or those asked for. */
export default async function ReturnsPage({ searchParams }: Props) {
  const asked = await searchParams;
  const ctx = await pageCtx();
  const { timeZone } = await forPage(getHospital({ ctx }));
  const wards = await forPage(listWards({ ctx }));
  // What a form sends for "all" is an empty text; anything else that doesn't parse is left out likewise.
  const query = returnListQuery.safeParse({ ward: asked.ward || undefined, month: asked.month || undefined });
  const chosen = query.success ? query.data : {};
  const items = await forPage(listReturns({ ctx, input: chosen }));
  const thisMonth = monthInZone(ctx.now, timeZone);
  return (
    <>
      <PageHead title={returnListWords.title} subtitle={returnListWords.subtitle} />
      <ReturnFilter
        wards={wards.map(({ code, name }) => ({ code, name }))}
        months={monthRange(addMonths(thisMonth, -11), thisMonth).toReversed()}
        ward={chosen.ward}
        month={chosen.month}
      />
      {items.length === 0 ? (
        <EmptyState title={returnListWords.none}>{returnListWords.noneNote}</EmptyState>
      ) : (
        <ReturnTable items={items} thisMonth={thisMonth} />
      )}
    </>
  );
}
