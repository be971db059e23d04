import "server-only";
import { uuidv7 } from "uuidv7";
import { withTransaction, type Ctx } from "@/db/transaction";
import { DomainError } from "@/lib/errors";
import { putFile } from "@/lib/files";
import { actorName, authorize, requireAction, scopeOf } from "@/lib/policy";
import type { ImportReply } from "@/lib/schemas/import";
import { importWords } from "@/lib/strings/imports";
import { writeAudit } from "@/lib/services/audit";
import { cutText, readOwnBytes, readUpload, type UploadSheet } from "@/lib/workbook";
import { countOutcomes, judgeLines } from "./judge-lines";
import { loadFacts } from "./load-facts";
import { getImport } from "./queries";
import { readLines } from "./read-lines";
import { dropRun, stageRun } from "./stage-rows";

const MAX_FILE_NAME = 120;
const MAX_HEADER = 60;

interface CheckInput {
  fileName: string;
  bytes: Uint8Array;
  signal?: AbortSignal;
  /** The bytes were written by Ebbline itself a moment ago: read here, without the guard of a worker. */
  isOwn?: boolean;
}

/**
 * Reads a workbook or CSV and says row by row what bringing it in would do. No record changes. Reading, hashing and
 * judging happen outside any transaction.
 */
export async function checkImport({ ctx, input }: { ctx: Ctx; input: CheckInput }): Promise<ImportReply> {
  requireAction(ctx.actor, "import.create");
  const sheet = input.isOwn ? readOwnBytes(input.bytes, input.fileName) : await readUpload(input);
  if (sheet.rows.length === 0) throw new DomainError("invalid", importWords.noRows);
  const checksum = await putFile(input.bytes);
  const id = await checkSheet(ctx, { ...input, checksum, sheet });
  return getImport({ ctx, input: { id, limit: sheet.rows.length } });
}

async function checkSheet(
  ctx: Ctx,
  { sheet, fileName, checksum }: { sheet: UploadSheet; fileName: string; checksum: string },
): Promise<string> {
  const lines = await readLines(sheet);
  const facts = await loadFacts(ctx, lines);
  const verdicts = await judgeLines(lines, facts, scopeOf(ctx.actor).wards !== "all");
  const counts = countOutcomes(verdicts);
  counts.skipped += sheet.skippedRowCount;
  const run = {
    id: uuidv7(),
    fileName: cutText(fileName, MAX_FILE_NAME),
    sheetName: sheet.sheetName,
    checksum,
    state: "checked" as const,
    counts,
    columns: sheet.columns.map((column) => ({ ...column, header: cutText(column.header, MAX_HEADER) })),
    uploadedById: ctx.actor.kind === "person" ? ctx.actor.personId : null,
    uploadedBy: actorName(ctx.actor),
    uploadedAt: ctx.now,
  };
  await stageRun(ctx, run, verdicts, sheet.skippedRows);
  try {
    await withTransaction(ctx, async (tx) => {
      authorize(tx.actor, "import.create", {});
      writeAudit(tx, {
        action: "import.check",
        subject: { type: "import", id: run.id },
        after: { fileName: run.fileName, checksum, counts },
      });
    });
  } catch (error) {
    await dropRun(ctx, run.id);
    throw error;
  }
  return run.id;
}
