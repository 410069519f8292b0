import { accessSync, constants } from "node:fs";
import { PlainError } from "./plain-error.ts";
import { run } from "./processes.ts";

/** Ordinary users of Debian have no sbin in their PATH. */
const sbin = ["/usr/local/sbin", "/usr/sbin", "/sbin"];

export type MariaDbPrograms = { server: string; install: string; version: string };

function findProgram(name: string): string | null {
  const folders = [...(process.env.PATH ?? "").split(":").filter(Boolean), ...sbin];
  for (const folder of folders) {
    try {
      accessSync(`${folder}/${name}`, constants.X_OK);
      return `${folder}/${name}`;
    } catch {}
  }
  return null;
}

/**
 * Where MariaDB's server is, and its release series ("10.11").
 * @throws PlainError where there is none
 */
export async function findMariaDb(): Promise<MariaDbPrograms> {
  const server = findProgram("mariadbd");
  const install = findProgram("mariadb-install-db");
  if (!server || !install) {
    throw new PlainError("MariaDB is missing. Install it with: sudo apt-get install -y mariadb-server");
  }
  const { output } = await run(server, ["--no-defaults", "--version"]);
  const version = /Ver (\d+\.\d+)\./.exec(output)?.[1];
  if (!version)
    throw new PlainError(`${server} does not say which version it is: ${output.trim().split("\n")[0]}`);
  return { server, install, version };
}
