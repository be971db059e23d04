import type { ErrorCode, FieldError } from "@/lib/errors/domain-error";
import type { RawTallyRow, UploadSummary } from "./raw-rows";

export interface ReadRequest {
  type: "read";
  bytes: Uint8Array;
  fileName: string;
}

/** Rows are asked for piece by piece: the main thread does other work in between. */
export type WorkerRequest = ReadRequest | { type: "more" };

export type WorkerReply =
  | { type: "summary"; summary: UploadSummary; rowCount: number }
  | { type: "rows"; rows: RawTallyRow[] }
  | { type: "refused"; code: ErrorCode; message: string; errors: FieldError[] }
  | { type: "crashed"; message: string };
