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

const generated = Array.from({ length: 24 }, (_, seed) =>
  randomProblem(seededRandom(seed + 1), {
    songs: 6 + (seed % 12),
    guitars: 1 + (seed % 3),
    necks: 4 + (seed % 6),
    rules: (["none", "light", "heavy"] as const)[seed % 3]!,
    realistic: seed % 4 !== 0,
    maxMoved: [null, 0, 1, 2, 3][seed % 5]!,
  }),
);

function inNode(problem: Problem): string {
  for (const { answer, done } of planInSteps(problem, { effort })) if (done) return JSON.stringify(answer);
  throw new Error("A search ended without an answer.");
}

/** The answers of the worker that pages use, in Chromium, as text. */
async function inChromium(problems: readonly Problem[]): Promise<string[]> {
  const file = readdirSync(`${buildFolder}/client/assets`).find((name) => name.startsWith("planner.browser"));
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
      path: `/assets/${file}`,
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
  for (const problem of generated.slice(0, 8)) {
    const answer = await fetch(`${app.url}/api/plan?effort=${effort}`, {
      method: "POST",
      headers: { "Content-Type": "application/json", Cookie: cookie },
      body: JSON.stringify(problem),
    });
    expect(answer.status).toBe(200);
    expect(await answer.text()).toBe(inNode(problem));
  }
});

const examples = planExamples();

test.skipIf(examples === null)(
  `worked problems (../shared/data/plan-examples.jsonl${examples ? "" : " is missing"}): the same, byte for byte`,
  async () => {
    const problems = (examples ?? []).map(({ problem }) => problem);
    expect(await inChromium(problems)).toEqual(problems.map(inNode));
  },
);
