import { spawn } from "node:child_process";
import { randomBytes } from "node:crypto";
import { mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { generateNKeysBetween } from "fractional-indexing";
import { nanoid } from "nanoid";
import { type Browser, chromium } from "playwright-core";
import { newGig } from "#app/domain/gig/new-gig.ts";
import { buildIfChanged } from "#app/launch/build.ts";
import { startMariaDb } from "#app/launch/mariadb.ts";
import { migrate } from "#app/launch/migrate.ts";
import { buildFolder } from "#app/launch/paths.ts";
import { freePort, untilListening } from "#app/launch/ports.ts";
import { insertGig } from "#app/models/gigs.server.ts";
import { createGuitar } from "#app/models/guitars.server.ts";
import { createSongs } from "#app/models/songs.server.ts";
import { closeDb, getDb } from "#app/services/db.server.ts";
import { closePasswordPool } from "#app/services/password.server.ts";
import { gigDetails } from "#tests/support/gigs.ts";
import { guitarFields, songFields } from "#tests/support/repertoire.ts";

export type Act = { actId: string };

const tunings = [
  [40, 45, 50, 55, 59, 64],
  [38, 45, 50, 55, 57, 62],
  [36, 43, 48, 53, 53, 60],
  [38, 43, 50, 55, 59, 62],
];

/** Puts guitars into an act, one for each short name, and answers with their ids. */
export async function seedGuitars(act: Act, shortNames: readonly string[]): Promise<string[]> {
  const ids: string[] = [];
  for (const shortName of shortNames) {
    const added = await getDb().transaction((trx) =>
      createGuitar(trx, act, guitarFields({ name: shortName, shortName })),
    );
    if (added.outcome === "saved") ids.push(added.id);
  }
  return ids;
}

/** A gig of one set in which nearly every gap has something to do: the guitars take turns, in four tunings and a capo. */
export async function seedGig(act: Act, guitars: readonly string[], songs: number): Promise<string> {
  const fields = Array.from({ length: songs }, (_, index) =>
    songFields({
      title: `Lamp Number ${index + 1}`,
      necks: [
        {
          id: null,
          open: tunings[(index * 7) % 4]!,
          capos: index % 3 === 0 ? [{ fret: 2, strings: [1, 2, 3, 4, 5, 6] }] : [],
          guitars: null,
          penalty: 0,
        },
      ],
    }),
  );
  const ids = await createSongs(getDb(), act, fields);
  const ranks = generateNKeysBetween(null, null, songs);
  const gig = newGig(gigDetails, { sets: 1, interval: 0, newId: () => nanoid(16) });
  const entries = ids.map((songId, index) => ({
    id: `e${songs}-${index}`,
    songId,
    setId: gig.sets[0]!.id,
    section: 0 as const,
    rank: ranks[index]!,
    guitarId: guitars[index % guitars.length]!,
    neckId: null,
    pinned: "none" as const,
    cover: null,
    techNote: "",
  }));
  return insertGig(getDb(), act, { ...gig, entries });
}

/** Starts a MariaDB and the built server of its own, lets them be measured, and leaves nothing behind. */
export async function withApp<T>(measure: (url: string) => Promise<T>): Promise<T> {
  const folder = mkdtempSync(`${tmpdir()}/stillpeg-bench-`);
  const database = await startMariaDb(folder, { throwaway: true });
  const port = await freePort();
  process.env.DATABASE_URL = database.url;
  process.env.SESSION_SECRET = randomBytes(32).toString("hex");
  process.env.PASSWORD_PEPPER = randomBytes(32).toString("hex");
  process.env.PASSWORD_COST = "4";
  try {
    await buildIfChanged();
    await migrate(getDb());
    const server = spawn(process.execPath, [`${buildFolder}/server/serve.js`], {
      env: { ...process.env, NODE_ENV: "production", PORT: String(port), LOG_LEVEL: "warn" },
      stdio: ["ignore", "inherit", "inherit", "ipc"],
    });
    const gone = new Promise((resolve) => server.once("exit", resolve));
    try {
      await untilListening("127.0.0.1", port, AbortSignal.timeout(20_000));
      return await measure(`http://127.0.0.1:${port}`);
    } finally {
      server.kill("SIGTERM");
      await gone;
    }
  } finally {
    await closePasswordPool();
    await closeDb();
    await database.stop();
    rmSync(folder, { recursive: true, force: true });
  }
}

/** Chromium as the benches use it: nothing of its own goes on beside the page. */
export function launchChromium(): Promise<Browser> {
  return chromium.launch({
    executablePath: "/usr/bin/chromium",
    args: [
      "--disable-gpu",
      "--disable-quic",
      "--disable-background-networking",
      "--disable-component-update",
    ],
  });
}
