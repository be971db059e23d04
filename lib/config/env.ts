import { z } from "zod";

/** Everything that the environment may set; see .env.example. Nothing else reads `process.env`. */
const envSchema = z.object({
  NODE_ENV: z.enum(["development", "production", "test"]).default("development"),
  PORT: z
    .string()
    .regex(/^\d{1,5}$/, "PORT is a number")
    .default("3000"),
  /** Address to listen on. */
  HOST: z.string().min(1).default("127.0.0.1"),
  EBBLINE_DATA: z.string().min(1).default(".data"),
  /** A PostgreSQL server; without it the embedded database in the data folder is used. */
  DATABASE_URL: z.string().startsWith("postgres").optional(),
  NEXTAUTH_URL: z.url().optional(),
  /** At least 32 characters; made and kept in the data folder when missing. */
  NEXTAUTH_SECRET: z.string().min(32, "NEXTAUTH_SECRET has at least 32 characters").optional(),
  /** Set by `npm run demo` alone: invented hospital, demo accounts. */
  EBBLINE_DEMO: z.enum(["0", "1"]).default("0"),
  /** 1 where a proxy in front sets the last entry of `x-forwarded-for`; otherwise the socket's address counts. */
  EBBLINE_TRUST_PROXY: z.enum(["0", "1"]).default("0"),
  HOSPITAL_NAME: z.string().min(1).max(120).default("Hospital without a name yet"),
  HOSPITAL_TIME_ZONE: z.string().min(1).default("UTC"),
  /** A fixed instant instead of the clock, for tests; refused unless the data folder is a demo's or a test's. */
  EBBLINE_CLOCK: z.iso.datetime().optional(),
  /** Milliseconds after which a killed process's hold on the data folder counts as left behind. */
  EBBLINE_LOCK_STALE_MS: z
    .string()
    .regex(/^\d{1,6}$/, "EBBLINE_LOCK_STALE_MS is a number of milliseconds")
    .transform(Number)
    .pipe(z.number().min(2_000, "EBBLINE_LOCK_STALE_MS is 2000 or more"))
    .default(10_000),
});

export type Env = z.infer<typeof envSchema>;
export const envNames = Object.keys(envSchema.shape);

/** Parses a raw environment; throws one Error that names every wrong variable. Empty text counts as not set. */
export function parseEnv(raw: Record<string, string | undefined>): Env {
  const given = Object.fromEntries(envNames.map((name) => [name, raw[name] === "" ? undefined : raw[name]]));
  const result = envSchema.safeParse(given);
  if (result.success) return result.data;
  const lines = result.error.issues.map((issue) => `${issue.path.join(".")}: ${issue.message}`);
  throw new Error(`The environment can't be used.\n${lines.join("\n")}`);
}

let parsed: Env | undefined;

/** The environment, parsed at first use and kept. */
export function env(): Env {
  parsed ??= parseEnv(process.env);
  return parsed;
}

/** What a start works out itself (a kept secret, the own address): for this process and what it loads later. */
export function supplyEnv(values: Partial<Record<keyof Env, string>>): void {
  Object.assign(process.env, values);
  parsed = undefined;
}
