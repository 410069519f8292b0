import { planGig } from "#app/domain/gig/plan.ts";
import { findGig } from "#app/models/gigs.server.ts";
import { loadRepertoire } from "#app/models/repertoire.server.ts";
import { getDb } from "#app/services/db.server.ts";
import { makeAct } from "#tests/support/factories.ts";
import { signInAs } from "#tests/support/sign-in.ts";
import { type Act, seedGig, seedGuitars } from "./bench-app.ts";
import { type BenchRow, median, microseconds, milliseconds } from "./timing.ts";

const sizes = [10, 30, 60];
const runs = 41;

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
export async function pageBench(url: string): Promise<{ pages: BenchRow[]; drag: BenchRow[] }> {
  const act = await makeAct(getDb());
  const { cookie } = await signInAs(getDb(), act.personId);
  const guitars = await seedGuitars(act, ["Alder", "Birch"]);
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
