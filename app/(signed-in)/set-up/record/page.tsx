import type { Metadata } from "next";
import { ButtonLink, Notice } from "@/app/_components/ui";
import { forPage } from "@/lib/auth";
import { formatCount } from "@/lib/indicators/chart-format";
import { auditQuery, type AuditPage } from "@/lib/schemas/audit";
import { getAuditPage } from "@/lib/services/audit";
import { getHospital } from "@/lib/services/hospital";
import { recordWords, setUpWords } from "@/lib/strings/set-up";
import { setUpCtx } from "../_components/set-up-ctx";
import { SetUpFrame } from "../_components/set-up-frame";
import { RecordTable } from "./_components/record-table";

export const metadata: Metadata = { title: setUpWords.record };

const PAGE_SIZE = 50;

interface RecordPageProps {
  searchParams: Promise<Record<string, string | string[] | undefined>>;
}

export default async function RecordPage({ searchParams }: RecordPageProps) {
  const ctx = await setUpCtx("audit.read");
  const { cursor } = await searchParams;
  // An address that no page of the list gave shows the newest entries.
  const asked = auditQuery.safeParse({ cursor });
  const input = { cursor: asked.data?.cursor, limit: PAGE_SIZE };
  const page = await forPage(getAuditPage({ ctx, input }));
  const { timeZone } = await forPage(getHospital({ ctx }));
  return (
    <SetUpFrame ctx={ctx} current="record" title={setUpWords.record} subtitle={recordWords.subtitle}>
      <ChainVerdict chain={page.chain} />
      <RecordTable items={page.items} timeZone={timeZone} />
      <nav className="actions mt-4" aria-label={recordWords.paging}>
        {input.cursor === undefined ? null : (
          <ButtonLink href="/set-up/record">{recordWords.newest}</ButtonLink>
        )}
        {page.nextCursor === null ? null : (
          <ButtonLink href={`/set-up/record?cursor=${page.nextCursor}`}>{recordWords.earlier}</ButtonLink>
        )}
      </nav>
    </SetUpFrame>
  );
}

/** Whether the record is whole, in words, and the checksum to compare with one noted elsewhere. */
function ChainVerdict({ chain }: { chain: AuditPage["chain"] }) {
  if (chain.brokenAt !== null) {
    return (
      <Notice mark="fix" className="mb-3">
        {recordWords.broken(formatCount(chain.brokenAt))}
      </Notice>
    );
  }
  if (chain.entries === 0) return <Notice className="mb-3">{recordWords.intactEmpty}</Notice>;
  return (
    <Notice mark="saved" className="mb-3">
      {recordWords.intact(formatCount(chain.entries))}
      <div className="hint checksum">
        {recordWords.head}: {chain.headHash}. {recordWords.headNote}
      </div>
    </Notice>
  );
}
