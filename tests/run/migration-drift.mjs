// Fails when the schema says something that no migration makes: generates into a copy and expects nothing new.
import { spawnSync } from "node:child_process";
import { cpSync, mkdtempSync, readdirSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { root } from "./steps.mjs";

const copy = mkdtempSync(path.join(tmpdir(), "ebbline-drift-"));
const out = path.join(copy, "migrations");
cpSync(path.join(root, "db/migrations"), out, { recursive: true });
const before = readdirSync(out).length;
const config = path.join(copy, "drizzle.config.json");
const schema = path.join(root, "db/schema/index.ts");
writeFileSync(config, JSON.stringify({ dialect: "postgresql", schema, out }));
const result = spawnSync("npx", ["drizzle-kit", "generate", "--config", config], {
  cwd: root,
  encoding: "utf8",
});
const isSame = result.status === 0 && readdirSync(out).length === before;
rmSync(copy, { recursive: true, force: true });
if (isSame) {
  console.log("The migrations make the schema.");
} else {
  console.error(result.stdout, result.stderr);
  console.error("The schema has changed without a migration: npm run migration -- --name what-changed");
  process.exit(1);
}
