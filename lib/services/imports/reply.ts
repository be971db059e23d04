import type { importRuns } from "@/db/schema";
import type { ImportMessage } from "@/lib/indicators/import-row";
import { MAX_MESSAGES, type ImportRowReply, type ImportSummary } from "@/lib/schemas/import";
import type { ImportRow } from "./queries";

type Run = typeof importRuns.$inferSelect;

export function summaryOf(run: Run, needsReason: boolean): ImportSummary {
  const isIn = run.state !== "checked";
  return {
    id: run.id,
    fileName: run.fileName,
    sheetName: run.sheetName,
    checksum: run.checksum,
    state: run.state,
    counts: run.counts,
    needsReason,
    uploadedBy: run.uploadedBy,
    uploadedAt: run.uploadedAt.toISOString(),
    committedAt: run.committedAt?.toISOString() ?? null,
    committedBy: run.committedBy,
    takenBackAt: run.takenBackAt?.toISOString() ?? null,
    reason: run.reason,
    accepted: run.accepted,
    version: run.version,
    broughtIn: isIn ? run.counts.new + run.counts.changed : 0,
  };
}

/** "D4: …" */
export function spokenMessage({ cell, message }: ImportMessage): string {
  return `${cell}: ${message}`;
}

/** Rows for a reply, which says at most 200 things; how many there are is counted. */
export function rowReplies(rows: readonly ImportRow[]): { rows: ImportRowReply[]; messageCount: number } {
  let messageCount = 0;
  const replies = rows.map((row) => {
    const messages = row.messages.slice(0, Math.max(0, MAX_MESSAGES - messageCount)).map(spokenMessage);
    messageCount += row.messages.length;
    const { ward, indicator, month, numerator, denominator, notCollected, note, outcome } = row;
    return {
      row: row.row,
      ward,
      indicator,
      month,
      numerator,
      denominator,
      notCollected,
      note,
      outcome,
      messages,
    };
  });
  return { rows: replies, messageCount };
}
