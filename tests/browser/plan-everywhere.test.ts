import { readdirSync } from "node:fs";
import { expect, test } from "vitest";
import type { Problem } from "#app/domain/planning/problem.ts";
import { buildFolder } from "#app/launch/paths.ts";
import { planInSteps } from "#app/workers/plan-in-steps.ts";
import { useApp } from "#tests/support/app.ts";
import { useBrowser } from "#tests/support/browser.ts";
import { makeAct } from "#tests/support/factories.ts";
import { planExamples } from "#tests/support/planning-examples.ts";
import { randomProblem, seededRandom } from "#tests/support/planning-random.ts";
import { signInAs } from "#tests/support/sign-in.ts";

const app = useApp();
const browser = useBrowser(app);

/** Enough to prove some of these sets and too little for others: what is left unproven must be equal too. */
const effort = 3_000;

/** More than this effort gets done with. */
const endless = randomProblem(seededRandom(11), {
  songs: 60,
  guitars: 4,
  necks: 12,
  rules: "light",
  realistic: true,
  maxMoved: null,
});

const small = Array.from({ length: 24 }, (_, seed) =>
  randomProblem(seededRandom(seed + 1), {
    songs: 6 + (seed % 12),
    guitars: 1 + (seed % 3),
    necks: 4 + (seed % 6),
    rules: (["none", "light", "heavy"] as const)[seed % 3]!,
    realistic: seed % 4 !== 0,
    maxMoved: [null, 0, 1, 2, 3][seed % 5]!,
  }),
);

const generated = [...small, endless];

function inNode(problem: Problem): string {
  for (const { answer, done } of planInSteps(problem, { effort })) if (done) return JSON.stringify(answer);
  throw new Error("A search ended without an answer.");
}

/** Where the worker is served that pages use. */
function workerPath(): string {
  const assets = readdirSync(`${buildFolder}/client/assets`);
  return `/assets/${assets.find((name) => name.startsWith("planner.browser"))}`;
}

/** The answers of the worker that pages use, in Chromium, as text. */
async function inChromium(problems: readonly Problem[]): Promise<string[]> {
  const page = await browser.page();
  await page.goto("/sign-in");
  return page.evaluate(
    ({ path, jobs, effort }) =>
      new Promise<string[]>((resolve, reject) => {
        const worker = new Worker(path, { type: "module" });
        const answers = new Map<string, string>();
        worker.onerror = (event) => reject(new Error(event.message));
        worker.onmessage = ({ data }) => {
          if (data.done) answers.set(data.key, JSON.stringify(data.answer));
          if (answers.size < jobs.length) return;
          worker.terminate();
          resolve(jobs.map(({ key }) => answers.get(key)!));
        };
        worker.postMessage({ run: 1, jobs, effort });
      }),
    {
      path: workerPath(),
      jobs: problems.map((problem, index) => ({ key: `${index}`, problem })),
      effort,
    },
  );
}

test("made-up sets: Chromium's worker and Node answer the same, byte for byte", async () => {
  const node = generated.map(inNode);
  expect(await inChromium(generated)).toEqual(node);
  const statuses = new Set(node.map((answer) => JSON.parse(answer).status));
  expect([...statuses]).toEqual(expect.arrayContaining(["optimal", "feasible"]));
});

test("made-up sets: the server answers the same, byte for byte", async () => {
  const { personId } = await makeAct(app.db);
  const { cookie } = await signInAs(app.db, personId);
  for (const problem of generated.slice(-8)) {
    const answer = await fetch(`${app.url}/api/plan?effort=${effort}`, {
      method: "POST",
      headers: { "Content-Type": "application/json", Cookie: cookie },
      body: JSON.stringify(problem),
    });
    expect(answer.status).toBe(200);
    expect(await answer.text()).toBe(inNode(problem));
  }
});

test("what is asked anew takes the place of what runs, which tells nothing more", async () => {
  const page = await browser.page();
  await page.goto("/sign-in");
  const told = await page.evaluate(
    ({ path, endless, small }) =>
      new Promise<{ run: number; done: boolean; late: boolean }[]>((resolve, reject) => {
        const worker = new Worker(path, { type: "module" });
        const told: { run: number; done: boolean; late: boolean }[] = [];
        let asked = false;
        worker.onerror = (event) => reject(new Error(event.message));
        worker.onmessage = ({ data }) => {
          const { run, done } = data;
          told.push({ run, done, late: told.some((one) => one.run > run) });
          if (!asked) worker.postMessage({ run: 2, jobs: [{ key: "small", problem: small }], effort: 1000 });
          asked = true;
          // Once it is idle, it has nothing left of what was asked first.
          if (run === 2 && done)
            worker.postMessage({ run: 3, jobs: [{ key: "again", problem: small }], effort: 1000 });
          if (run !== 3) return;
          worker.terminate();
          resolve(told);
        };
        worker.postMessage({ run: 1, jobs: [{ key: "endless", problem: endless }], effort: 100_000_000 });
      }),
    { path: workerPath(), endless, small: small[0]! },
  );
  expect(told.filter(({ run }) => run === 1).length).toBeGreaterThan(0);
  expect(told.filter(({ run, done }) => run === 1 && done)).toEqual([]);
  expect(told.filter(({ late }) => late)).toEqual([]);
  expect(told.filter(({ done }) => done).map(({ run }) => run)).toEqual([2, 3]);
});

const examples = planExamples();

test.skipIf(examples === null)(
  `worked problems (../shared/data/plan-examples.jsonl${examples ? "" : " is missing"}): the same, byte for byte`,
  async () => {
    const problems = (examples ?? []).map(({ problem }) => problem);
    expect(await inChromium(problems)).toEqual(problems.map(inNode));
  },
);
