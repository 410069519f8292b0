import { spawn } from "node:child_process";
import { randomBytes } from "node:crypto";
import { mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { generateNKeysBetween } from "fractional-indexing";
import { newGig } from "#app/domain/gig/new-gig.ts";
import { planGig } from "#app/domain/gig/plan.ts";
import { buildIfChanged } from "#app/launch/build.ts";
import { startMariaDb } from "#app/launch/mariadb.ts";
import { migrate } from "#app/launch/migrate.ts";
import { buildFolder } from "#app/launch/paths.ts";
import { freePort, untilListening } from "#app/launch/ports.ts";
import { findGig, insertGig } from "#app/models/gigs.server.ts";
import { createGuitar } from "#app/models/guitars.server.ts";
import { loadRepertoire } from "#app/models/repertoire.server.ts";
import { createSongs } from "#app/models/songs.server.ts";
import { closeDb, getDb } from "#app/services/db.server.ts";
import { closePasswordPool } from "#app/services/password.server.ts";
import { makeAct } from "#tests/support/factories.ts";
import { gigDetails } from "#tests/support/gigs.ts";
import { guitarFields, songFields } from "#tests/support/repertoire.ts";
import { signInAs } from "#tests/support/sign-in.ts";
import { type BenchRow, median, microseconds, milliseconds } from "./timing.ts";

const sizes = [10, 30, 60];
const runs = 41;

const tunings = [
  [40, 45, 50, 55, 59, 64],
  [38, 45, 50, 55, 57, 62],
  [36, 43, 48, 53, 53, 60],
  [38, 43, 50, 55, 59, 62],
];

type Act = { actId: string };

async function seedGig(act: Act, guitars: string[], songs: number): Promise<string> {
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
  const gig = newGig(gigDetails, { sets: 1, interval: 0, newId: () => `bench-${songs}` });
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

async function time(url: string, cookie: string): Promise<number> {
  const times: number[] = [];
  for (let run = -5; run < runs; run += 1) {
    const start = performance.now();
    const response = await fetch(url, { headers: { Cookie: cookie } });
    if (!response.ok) throw new Error(`${url} answered ${response.status}`);
    await response.text();
    if (run >= 0) times.push(performance.now() - start);
  }
  return median(times);
}

/** Planning every row anew, as each move of a drag does. */
async function rescore(act: Act, gigId: string): Promise<number> {
  const gig = await findGig(getDb(), act, gigId);
  const repertoire = await loadRepertoire(getDb(), act);
  if (!gig) throw new Error("The bench's gig is gone");
  const times: number[] = [];
  for (let run = -200; run < 400; run += 1) {
    const start = performance.now();
    planGig(gig, repertoire);
    if (run >= 0) times.push(performance.now() - start);
  }
  return median(times);
}

/** Milliseconds until a page of the built server is there, over loopback with a real MariaDB, as ratios to the sign-in page. */
async function measure(url: string): Promise<{ pages: BenchRow[]; drag: BenchRow[] }> {
  const act = await makeAct(getDb());
  const { cookie } = await signInAs(getDb(), act.personId);
  const guitars: string[] = [];
  for (const shortName of ["Alder", "Birch"]) {
    const added = await getDb().transaction((trx) =>
      createGuitar(trx, act, guitarFields({ name: shortName, shortName })),
    );
    if (added.outcome === "saved") guitars.push(added.id);
  }
  const bare = await time(`${url}/sign-in`, "");
  const pages: BenchRow[] = [{ what: "sign-in page, no session", figure: milliseconds(bare), ratio: 1 }];
  const drag: BenchRow[] = [];
  let first = 0;
  for (const songs of sizes) {
    const gigId = await seedGig(act, guitars, songs);
    const page = await time(`${url}/gigs/${gigId}`, cookie);
    pages.push({ what: `gig page, ${songs} songs`, figure: milliseconds(page), ratio: page / bare });
    const again = await rescore(act, gigId);
    first ||= again;
    drag.push({
      what: `all rows planned anew, ${songs} songs`,
      figure: microseconds(again * 1000),
      ratio: again / first,
    });
  }
  const library = await time(`${url}/songs`, cookie);
  pages.push({
    what: `song library, ${sizes.reduce((sum, one) => sum + one, 0)} songs`,
    figure: milliseconds(library),
    ratio: library / bare,
  });
  return { pages, drag };
}

/** Starts a MariaDB and the built server of its own, measures, and leaves nothing behind. */
export async function pageBench(): Promise<{ pages: BenchRow[]; drag: BenchRow[] }> {
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
