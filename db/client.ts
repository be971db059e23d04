import path from "node:path";
import { PGlite } from "@electric-sql/pglite";
import { drizzle as drizzlePglite } from "drizzle-orm/pglite";
import { migrate as migratePglite } from "drizzle-orm/pglite/migrator";
import { drizzle as drizzleServer } from "drizzle-orm/node-postgres";
import { migrate as migrateServer } from "drizzle-orm/node-postgres/migrator";
import type { PgDatabase, PgQueryResultHKT } from "drizzle-orm/pg-core";
import { Pool } from "pg";
import { env } from "@/lib/config/env";
import { holdFolder, type FolderLock } from "./folder-lock";
import * as schema from "./schema";

/** One type for the embedded database, a server and a transaction on either. */
export type Db = PgDatabase<PgQueryResultHKT, typeof schema>;

export interface Store {
  db: Db;
  kind: "embedded" | "server";
  close: () => Promise<void>;
}

/** Arbitrary, fixed: orders processes that start at once on one server while they migrate. */
const MIGRATION_LOCK = 7_203_114;

const migrationsFolder = () => path.resolve(/* turbopackIgnore: true */ process.cwd(), "db/migrations");

export function dataFolder(): string {
  return path.resolve(/* turbopackIgnore: true */ process.cwd(), env().EBBLINE_DATA);
}

/** Opens, locks and migrates the embedded database in a folder. Fails where another process holds the folder. */
export async function openEmbedded(folder: string): Promise<Store> {
  const lock: FolderLock = await holdFolder(folder, { stale: env().EBBLINE_LOCK_STALE_MS });
  try {
    const engine = await PGlite.create(path.join(folder, "database"));
    const store = await wrapEmbedded(engine);
    const close = async () => {
      await store.close();
      await lock.release();
    };
    return { ...store, close };
  } catch (error) {
    await lock.release();
    throw error;
  }
}

/** Wraps and migrates an engine that is open already: tests clone one from a migrated image. */
export async function wrapEmbedded(engine: PGlite): Promise<Store> {
  const db = drizzlePglite(engine, { schema });
  await migratePglite(db, { migrationsFolder: migrationsFolder() });
  return { db, kind: "embedded", close: () => engine.close() };
}

/** Connects to a PostgreSQL server and migrates it, one process at a time. */
export async function openServer(url: string): Promise<Store> {
  const pool = new Pool({ connectionString: url, max: 10 });
  const guard = await pool.connect();
  try {
    await guard.query("select pg_advisory_lock($1)", [MIGRATION_LOCK]);
    await migrateServer(drizzleServer(guard, { schema }), { migrationsFolder: migrationsFolder() });
    await guard.query("select pg_advisory_unlock($1)", [MIGRATION_LOCK]);
  } finally {
    guard.release();
  }
  return { db: drizzleServer(pool, { schema }), kind: "server", close: () => pool.end() };
}

// A bundler may load this module more than once in a process; the open store must still be one.
const holder = globalThis as typeof globalThis & { __ebblineStore?: Promise<Store> };

/** The process's store, opened at first use. */
export function getStore(): Promise<Store> {
  const { DATABASE_URL } = env();
  holder.__ebblineStore ??= DATABASE_URL ? openServer(DATABASE_URL) : openEmbedded(dataFolder());
  return holder.__ebblineStore;
}

export async function getDb(): Promise<Db> {
  return (await getStore()).db;
}

export async function closeStore(): Promise<void> {
  const open = holder.__ebblineStore;
  holder.__ebblineStore = undefined;
  if (open) await (await open).close();
}
