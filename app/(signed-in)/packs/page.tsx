import type { Metadata } from "next";
import { EmptyState, PageHead } from "@/app/_components/ui";
import { pageCtx } from "@/lib/auth";
import { packWords } from "@/lib/strings/people";

export const metadata: Metadata = { title: packWords.title };

export default async function PacksPage() {
  await pageCtx();
  return (
    <>
      <PageHead title={packWords.title} />
      <EmptyState title={packWords.emptyTitle}>{packWords.empty}</EmptyState>
    </>
  );
}
