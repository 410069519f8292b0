import { spawnSync } from "node:child_process";
import { existsSync } from "node:fs";
import { expect, test } from "vitest";
import { projectFolder } from "#app/launch/paths.ts";

function ensure(args: string[], node: string[] = []) {
  const { status, stdout, stderr } = spawnSync(
    process.execPath,
    [...node, "app/launch/ensure.mjs", ...args],
    {
      cwd: projectFolder,
      encoding: "utf8",
    },
  );
  return { status, stdout, stderr };
}

/** Node arguments that change, before ensure.mjs runs, what it sees of this machine. */
function machine(script: string): string[] {
  return ["--import", `data:text/javascript,${encodeURIComponent(script)}`];
}

const nothingInstalled = `
import fs from "node:fs";
import { syncBuiltinESMExports } from "node:module";
const real = fs.accessSync;
fs.accessSync = (path, mode) => {
  if (/(mariadb|chromium)/.test(path)) throw new Error("not there");
  return real(path, mode);
};
`;

test("with everything there it says nothing", () => {
  expect(existsSync(`${projectFolder}/node_modules/.stillpeg-stamp`)).toBe(true);
  expect(ensure(["mariadb", "chromium"])).toEqual({ status: 0, stdout: "", stderr: "" });
});

test("an ordinary user gets the one line that installs what is missing", () => {
  const elsewhere = machine(`${nothingInstalled} process.getuid = () => 1000; syncBuiltinESMExports();`);
  const { status, stderr } = ensure(["mariadb", "chromium"], elsewhere);
  expect(status).toBe(1);
  expect(stderr).toBe(
    'MariaDB and Chromium are missing. Run this, then start again: sudo sh -c "apt-get update && apt-get install -y mariadb-server chromium"\n',
  );
});

test("root installs it with apt, and hears what apt said where that fails", () => {
  const elsewhere = machine(`${nothingInstalled} process.getuid = () => 0;
import childProcess from "node:child_process";
childProcess.spawnSync = (command, args) => {
  console.log(command, ...args);
  return args[0] === "update" ? { status: 0 } : { status: 100, stdout: "", stderr: "E: no such package" };
};
syncBuiltinESMExports();`);
  const { status, stdout, stderr } = ensure(["mariadb"], elsewhere);
  expect(status).toBe(1);
  expect(stdout).toBe(
    "Installing MariaDB.\napt-get update\napt-get install -y --no-install-recommends mariadb-server\n",
  );
  expect(stderr).toContain("E: no such package");
  expect(stderr).toContain("Run by hand: apt-get update && apt-get install -y mariadb-server");
});

test("with DATABASE_URL no server of our own is asked for", () => {
  const elsewhere = machine(
    `${nothingInstalled} process.env.DATABASE_URL = "mysql://h/d"; syncBuiltinESMExports();`,
  );
  expect(ensure(["database"], elsewhere)).toEqual({ status: 0, stdout: "", stderr: "" });
});

test("an old Node is named", () => {
  const elsewhere = machine(`Object.defineProperty(process.versions, "node", { value: "18.20.0" });`);
  const { status, stderr } = ensure([], elsewhere);
  expect(status).toBe(1);
  expect(stderr).toBe("Stillpeg needs Node 20.19 or newer, and this is 18.20.0.\n");
});
