import type { Metadata } from "next";
import { Button, ButtonLink, EmptyState, Notice, PageHead, Select } from "@/app/_components/ui";
import { forPage, pageCtx } from "@/lib/auth";
import { signalStatuses } from "@/lib/indicators/vocabulary";
import { signalQuery } from "@/lib/schemas/signal";
import { listSignalsInWords } from "@/lib/services/signals";
import { listWards, type Ward } from "@/lib/services/wards";
import { signalsPageWords as words, signalStatusWords } from "@/lib/strings/signals";
import { addressOf, filled, type SearchParams } from "../charts/_components/search-params";
import { SignalsTable } from "./_components/signals-table";
import "../charts/_components/charts.css";

export const metadata: Metadata = { title: words.title };

/** What the list shows unless the address says otherwise. */
const ACTIVE = "new,in_review";

/** Signals on record, newest first; which ones stands in the address. */
export default async function SignalsPage({ searchParams }: { searchParams: Promise<SearchParams> }) {
  const ctx = await pageCtx();
  const search = filled(await searchParams);
  const query = signalQuery.safeParse({ status: ACTIVE, ...search });
  const input = query.success ? query.data : signalQuery.parse({ status: ACTIVE });
  const { items, nextCursor } = await forPage(listSignalsInWords({ ctx, input }));
  const wards = await forPage(listWards({ ctx }));
  return (
    <>
      <PageHead title={words.title} subtitle={words.subtitle} />
      {query.success ? null : (
        <Notice mark="fix" className="mb-3">
          {query.error.issues[0]?.message}
        </Notice>
      )}
      <Filter search={search} wards={wards} />
      {items.length === 0 ? (
        <EmptyState title={words.none}>{words.noneNote}</EmptyState>
      ) : (
        <SignalsTable items={items} />
      )}
      <div className="actions mt-3">
        {search.cursor ? (
          <ButtonLink href={addressOf("/signals", search, { cursor: undefined })}>{words.first}</ButtonLink>
        ) : null}
        {nextCursor ? (
          <ButtonLink href={addressOf("/signals", search, { cursor: nextCursor })}>{words.next}</ButtonLink>
        ) : null}
      </div>
    </>
  );
}

function Filter({ search, wards }: { search: Record<string, string>; wards: Ward[] }) {
  return (
    <form className="view-form mb-3" method="get">
      {search.indicator ? <input type="hidden" name="indicator" value={search.indicator} /> : null}
      <Select
        id="status"
        name="status"
        label={words.statusFilter}
        defaultValue={search.status ?? ACTIVE}
        inline
      >
        <option value={ACTIVE}>{words.active}</option>
        {signalStatuses.map((status) => (
          <option key={status} value={status}>
            {signalStatusWords[status]}
          </option>
        ))}
        <option value={signalStatuses.join(",")}>{words.all}</option>
      </Select>
      {wards.length > 1 ? (
        <Select
          id="ward"
          name="ward"
          label={words.wardFilter}
          defaultValue={search.ward?.toUpperCase() ?? ""}
          inline
        >
          <option value="">{words.allWards}</option>
          {wards.map((ward) => (
            <option key={ward.code} value={ward.code}>
              {ward.name}
            </option>
          ))}
        </Select>
      ) : null}
      <Button type="submit">{words.filter}</Button>
    </form>
  );
}
