// A PostgreSQL server of our own in a temporary folder, for as long as the checks run.
import { spawnSync } from "node:child_process";
import { mkdtempSync, readdirSync, rmSync } from "node:fs";
import { createServer } from "node:net";
import { tmpdir } from "node:os";
import path from "node:path";

/** Debian keeps the server's programs outside the PATH, one folder a version. */
function programFolder() {
  const versions = readdirSync("/usr/lib/postgresql").sort((left, right) => Number(right) - Number(left));
  return `/usr/lib/postgresql/${versions[0]}/bin`;
}

/** @returns {Promise<number>} */
function freePort() {
  return new Promise((resolve, reject) => {
    const probe = createServer();
    probe.on("error", reject);
    probe.listen(0, "127.0.0.1", () => {
      const address = probe.address();
      probe.close(() => resolve(typeof address === "object" && address ? address.port : 0));
    });
  });
}

/** The server refuses to run as root, so root hands it to the account that Debian made for it. @param {string} command */
function asServerUser(command) {
  const isRoot = process.getuid?.() === 0;
  const [program, args] = isRoot
    ? ["su", ["postgres", "-s", "/bin/sh", "-c", command]]
    : ["sh", ["-c", command]];
  // Started in the background it would keep a pipe open for ever, hence no pipes.
  return spawnSync(program, args, { stdio: ["ignore", "ignore", "inherit"], cwd: "/" }).status === 0;
}

/** Starts a server; the caller stops it. @returns {Promise<{ url: string, stop: () => void }>} */
export async function startPostgres() {
  const bin = programFolder();
  const folder = mkdtempSync(path.join(tmpdir(), "ebbline-postgres-"));
  if (process.getuid?.() === 0) spawnSync("chown", ["postgres", folder]);
  const port = await freePort();
  const data = path.join(folder, "data");
  const isMade = asServerUser(`${bin}/initdb -D ${data} -U tester --auth=trust --encoding=UTF8 --no-locale`);
  const options = `-p ${port} -c listen_addresses=127.0.0.1 -c unix_socket_directories=${folder} -c max_connections=200 -c fsync=off`;
  const isUp = isMade && asServerUser(`${bin}/pg_ctl -D ${data} -o "${options}" -l ${folder}/log -w start`);
  if (!isUp) throw new Error("PostgreSQL did not start.");
  return {
    url: `postgres://tester@127.0.0.1:${port}/postgres`,
    stop: () => {
      asServerUser(`${bin}/pg_ctl -D ${data} -m immediate stop`);
      rmSync(folder, { recursive: true, force: true });
    },
  };
}
