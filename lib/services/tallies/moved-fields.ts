import "server-only";
import { and, desc, eq, notInArray } from "drizzle-orm";
import type { Db } from "@/db/client";
import { tallyRevisions } from "@/db/schema";
import {
  BLANK_TALLY,
  differingFields,
  type TallyContent,
  type TallyField,
} from "@/lib/indicators/tally-change";
import { contentOf, type Line } from "./lines";

/** What a save is based on, by the versions that it saw. */
export interface SeenVersions {
  version: number;
  denominatorVersion?: number | undefined;
}

/**
 * True where a field that this change would write has moved since the versions that it was based on. A save of one
 * box therefore never collides with a save of another.
 */
export async function isStale(
  db: Db,
  wardId: string,
  line: Line,
  next: TallyContent,
  seen: SeenVersions,
): Promise<boolean> {
  const wanted = differingFields(contentOf(line), next);
  const own = wanted.filter((field) => !line.shared || (field !== "denominator" && field !== "awaited"));
  const reachesShared = own.length < wanted.length;
  // Without a version of the shared denominator a save says that it saw none.
  if (reachesShared && (seen.denominatorVersion ?? 0) !== (line.shared?.value?.version ?? 0)) return true;
  const current = line.tally?.version ?? 0;
  if (own.length === 0 || seen.version === current) return false;
  if (seen.version > current) return true;
  const moved = await movedSince(db, wardId, line, seen.version);
  return moved === null || own.some((field) => moved.includes(field));
}

/** Fields that have moved since a version, or null where nothing is known of it. */
async function movedSince(db: Db, wardId: string, line: Line, version: number): Promise<TallyField[] | null> {
  if (version === 0) return differingFields(BLANK_TALLY, contentOf(line));
  const [seen] = await db
    .select()
    .from(tallyRevisions)
    .where(
      and(
        eq(tallyRevisions.wardId, wardId),
        eq(tallyRevisions.indicatorId, line.indicator.id),
        eq(tallyRevisions.month, line.month),
        eq(tallyRevisions.tallyVersion, version),
        // These two hold what was asked for, not what the line said.
        notInArray(tallyRevisions.event, ["correction-asked", "correction-declined"]),
      ),
    )
    .orderBy(desc(tallyRevisions.at), desc(tallyRevisions.id))
    .limit(1);
  return seen ? differingFields(seen, contentOf(line)) : null;
}
