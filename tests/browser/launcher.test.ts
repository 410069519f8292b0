import { type ChildProcess, spawn, spawnSync } from "node:child_process";
import { existsSync, mkdtempSync, readdirSync, readFileSync, rmSync, statSync, writeFileSync } from "node:fs";
import { createServer } from "node:net";
import { tmpdir } from "node:os";
import { setTimeout as pause } from "node:timers/promises";
import { afterAll, afterEach, beforeAll, beforeEach, expect, test } from "vitest";
import { endLeftBehind } from "#app/launch/mariadb.ts";
import { projectFolder } from "#app/launch/paths.ts";
import { freePort } from "#app/launch/ports.ts";
import { ended } from "#app/launch/processes.ts";

/** One data folder for all: what one test leaves, the next must be able to start from. */
let folder: string;
let port: number;
let launchers: Launcher[] = [];

beforeAll(() => {
  folder = mkdtempSync(`${tmpdir()}/stillpeg-start-`);
});
beforeEach(async () => {
  port = await freePort();
});
afterEach(async () => {
  for (const launcher of launchers) {
    launcher.child.kill("SIGTERM");
    await launcher.over;
  }
  launchers = [];
});
afterAll(async () => {
  await endLeftBehind(`${folder}/mariadb`);
  rmSync(folder, { recursive: true });
});

type Launcher = {
  child: ChildProcess;
  over: Promise<number>;
  said(): string;
  until(text: string): Promise<void>;
};

/** `npm start` as it is after npm itself. */
function start(env: Record<string, string> = {}): Launcher {
  const child = spawn(process.execPath, ["--import", "tsx", "app/launch/start.ts"], {
    cwd: projectFolder,
    env: {
      PATH: process.env.PATH,
      HOME: process.env.HOME,
      DATA_FOLDER: folder,
      PORT: String(port),
      PASSWORD_COST: "4",
      SEED_DEMO: "0",
      ...env,
    },
    stdio: ["ignore", "pipe", "pipe"],
  });
  let said = "";
  child.stdout.on("data", (part: Buffer) => {
    said += part.toString();
  });
  child.stderr.on("data", (part: Buffer) => {
    said += part.toString();
  });
  const over = ended(child);
  const until = async (text: string) => {
    const deadline = Date.now() + 40_000;
    while (!said.includes(text)) {
      if (child.exitCode !== null || Date.now() > deadline)
        throw new Error(`It never said "${text}": ${said}`);
      await pause(20);
    }
  };
  const launcher = { child, over, said: () => said, until };
  launchers.push(launcher);
  return launcher;
}

/** What doing nothing takes on this machine now: about 300 ms where it has nothing else to do. */
function millisecondsToStartNode(): number {
  const began = performance.now();
  spawnSync(process.execPath, ["--import", "tsx", "--eval", "0"], { cwd: projectFolder });
  return performance.now() - began;
}

const up = "Ctrl-C stops it.";
const health = async () => (await fetch(`http://127.0.0.1:${port}/api/health`)).status;

/** The commands of all processes that have to do with this test's data folder or its port. */
function left(): string[] {
  return readdirSync("/proc")
    .filter((name) => /^\d+$/.test(name) && Number(name) !== process.pid)
    .flatMap((pid) => {
      try {
        const command = readFileSync(`/proc/${pid}/cmdline`, "utf8").replaceAll("\0", " ");
        const environment = readFileSync(`/proc/${pid}/environ`, "utf8");
        return command && (command.includes(folder) || environment.includes(`DATA_FOLDER=${folder}`))
          ? [command]
          : [];
      } catch {
        return [];
      }
    });
}

test("it serves, tells the sign-ins, keeps secrets to its owner, and one signal stops everything", async () => {
  const first = start({ SEED_DEMO: "1" });
  await first.until(up);
  expect(await health()).toBe(200);
  const [password] = /[a-z2-9]{5}-[a-z2-9]{5}-[a-z2-9]{5}/.exec(first.said()) ?? [];
  for (const role of ["owner", "performer", "tech", "guest"])
    expect(first.said()).toContain(`${role}@example.test`);
  for (const file of ["secrets.json", "mariadb/server.json"]) {
    expect(statSync(`${folder}/${file}`).mode & 0o777, file).toBe(0o600);
  }

  const asked = performance.now();
  first.child.kill("SIGINT");
  first.child.kill("SIGINT");
  expect(await first.over).toBe(0);
  expect(performance.now() - asked).toBeLessThan(3_000);
  expect(left()).toEqual([]);

  const allowed = Math.max(5_000, 12 * millisecondsToStartNode());
  const began = performance.now();
  const second = start({ SEED_DEMO: "1" });
  await second.until(up);
  expect(performance.now() - began).toBeLessThan(allowed);
  expect(second.said()).toContain(password);
  const form = new URLSearchParams({ email: "owner@example.test", password: password ?? "" });
  const signIn = await fetch(`http://127.0.0.1:${port}/sign-in`, {
    method: "POST",
    body: form,
    redirect: "manual",
  });
  expect(signIn.status).toBe(302);
});

test("a database that dies is started again, and a server that dies ends it all with one line", async () => {
  const launcher = start();
  await launcher.until(up);
  process.kill(Number(readFileSync(`${folder}/mariadb/server.pid`, "utf8")), "SIGKILL");
  await launcher.until("MariaDB ended by itself. Starting it again.");
  await expect.poll(health, { timeout: 8_000 }).toBe(200);

  const { server } = JSON.parse(readFileSync(`${folder}/running.json`, "utf8"));
  process.kill(server.pid, "SIGKILL");
  expect(await launcher.over).toBe(1);
  expect(launcher.said()).toContain("The server ended by itself (SIGKILL)");
  expect(left()).toEqual([]);
});

test("a launcher that was killed leaves nothing that stops the next one", async () => {
  const killed = start();
  await killed.until(up);
  killed.child.kill("SIGKILL");
  await killed.over;
  const next = start();
  await next.until(up);
  expect(await health()).toBe(200);
  next.child.kill("SIGTERM");
  expect(await next.over).toBe(0);
  expect(left()).toEqual([]);
});

test("a second launcher on the same folder says who is there and leaves it be", async () => {
  const first = start();
  await first.until(up);
  const second = start({ PORT: String(await freePort()) });
  expect(await second.over).toBe(1);
  expect(second.said().trim()).toBe(
    `Stillpeg already runs from this folder (process ${first.child.pid}). Stop it first.`,
  );
  expect(await health()).toBe(200);
});

test("a port in use is one line, and nothing is started", async () => {
  const other = createServer().listen(port, "127.0.0.1");
  const launcher = start();
  expect(await launcher.over).toBe(1);
  other.close();
  expect(launcher.said().trim()).toBe(
    `Port ${port} on 127.0.0.1 is in use. Stop what uses it, or start with PORT=… set to another.`,
  );
  expect(left()).toEqual([]);
});

test("data of another series of MariaDB are left alone", async () => {
  const file = `${folder}/mariadb/server.json`;
  const known = readFileSync(file, "utf8");
  writeFileSync(file, known.replace(/"version": "[\d.]+"/, '"version": "5.5"'));
  const launcher = start();
  expect(await launcher.over).toBe(1);
  writeFileSync(file, known);
  expect(launcher.said().trim().split("\n")).toHaveLength(1);
  expect(launcher.said()).toContain("were written by MariaDB 5.5");
});

test("a signal while it starts stops what has begun", async () => {
  const launcher = start();
  await expect.poll(() => existsSync(`${folder}/running.json`), { timeout: 10_000 }).toBe(true);
  launcher.child.kill("SIGTERM");
  expect(await launcher.over).toBe(0);
  expect(left()).toEqual([]);
});

test("with DATABASE_URL no server is started, and one that does not answer is one line", async () => {
  const launcher = start({ DATABASE_URL: `mysql://nobody:x@127.0.0.1:${await freePort()}/nothing` });
  expect(await launcher.over).toBe(1);
  expect(launcher.said()).toMatch(
    /^The database at 127\.0\.0\.1:\d+\/nothing does not answer: .*ECONNREFUSED/m,
  );
  expect(left()).toEqual([]);
});

test("production makes no secrets up", async () => {
  const launcher = start({ NODE_ENV: "production" });
  expect(await launcher.over).toBe(1);
  expect(launcher.said()).toContain("In production SESSION_SECRET and PASSWORD_PEPPER must be set");
});
