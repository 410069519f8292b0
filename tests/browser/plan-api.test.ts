import { connect } from "node:net";
import { expect, test } from "vitest";
import { useApp } from "#tests/support/app.ts";
import { makeAct } from "#tests/support/factories.ts";
import { randomProblem, seededRandom } from "#tests/support/planning-random.ts";
import { workedExample } from "#tests/support/planning-worked-example.ts";
import { signInAs } from "#tests/support/sign-in.ts";

// One thread, whatever this machine has: then it can be told when it is busy.
process.env.PLANNER_THREADS = "1";
const app = useApp();

/** More than run and wait at once, see planner-pool.server.ts. */
const tooMany = 16;

/** A set that takes the server far longer than any of these tests. */
const endless = JSON.stringify(
  randomProblem(seededRandom(11), {
    songs: 60,
    guitars: 4,
    necks: 12,
    rules: "light",
    realistic: true,
    maxMoved: null,
  }),
);

async function member(): Promise<string> {
  const { personId } = await makeAct(app.db);
  return (await signInAs(app.db, personId)).cookie;
}

function plan(
  cookie: string,
  body: string,
  { signal, effort = 1000 }: { signal?: AbortSignal; effort?: number } = {},
) {
  return fetch(`${app.url}/api/plan?effort=${effort}`, {
    method: "POST",
    headers: { "Content-Type": "application/json", Cookie: cookie },
    body,
    ...(signal ? { signal } : {}),
  });
}

test("an answer says what it might cost and why it ended", async () => {
  const cookie = await member();
  const small = await plan(cookie, JSON.stringify(workedExample));
  expect(small.status).toBe(200);
  expect(await small.json()).toMatchObject({ status: "optimal", total: 9 });
  const limits = (answer: Response) =>
    ["Plan-Effort", "Plan-Seconds", "Plan-Ended"].map((name) => answer.headers.get(name));
  expect(limits(small)).toEqual(["1000", "20", "settled"]);
  const cut = await plan(cookie, endless, { effort: 50 });
  const answer = await cut.json();
  expect(answer.status).toBe("feasible");
  expect(answer.bound).toBeLessThan(answer.total);
  expect(limits(cut)).toEqual(["50", "20", "effort"]);
});

test("what is no problem is refused with all that is wrong, what is too long at once, strangers before both", async () => {
  const cookie = await member();
  const bad = await plan(cookie, JSON.stringify({ ...workedExample, version: 2, maxMoved: 0.5 }));
  expect(bad.status).toBe(400);
  const { problems } = await bad.json();
  expect(problems.map(({ path }: { path: string }) => path).toSorted()).toEqual(["maxMoved", "version"]);
  for (const problem of problems) expect(problem.remedy).not.toBe("");
  const long = await plan(cookie, `"${"x".repeat(1024 * 1024)}"`);
  expect(long.status).toBe(413);
  expect((await long.json()).problems).toHaveLength(1);
  const stranger = await plan("", JSON.stringify(workedExample));
  expect(stranger.status).toBe(401);
  expect((await stranger.json()).message).toContain("Sign in");
  const foreign = await fetch(`${app.url}/api/plan`, {
    method: "POST",
    headers: { Cookie: cookie, Origin: "https://elsewhere.example" },
    body: JSON.stringify(workedExample),
  });
  expect(foreign.status).toBe(403);
  await foreign.text();
});

test("a full queue says when to come back, and clients that go make room at once", async () => {
  const cookie = await member();
  const gone = new AbortController();
  const refused: Response[] = [];
  const waiting = Array.from({ length: tooMany }, () =>
    plan(cookie, endless, { signal: gone.signal, effort: 100_000_000 }).then(
      (answer) => refused.push(answer),
      (error: Error) => error.name,
    ),
  );
  await expect.poll(() => refused.length, { timeout: 10_000 }).toBeGreaterThan(0);
  for (const answer of refused) {
    expect(answer.status).toBe(429);
    expect(Number(answer.headers.get("Retry-After"))).toBeGreaterThan(0);
    expect((await answer.json()).message).toContain("Try again");
  }

  const began = performance.now();
  gone.abort();
  const ends = await Promise.all(waiting);
  expect(ends.filter((end) => end === "AbortError")).toHaveLength(tooMany - refused.length);
  expect(refused.length).toBeLessThan(tooMany / 2);
  const next = async () => (await plan(cookie, JSON.stringify(workedExample))).status;
  await expect.poll(next, { timeout: 10_000 }).toBe(200);
  // Had the thread gone on with what nobody waits for, this would have taken the 20 s that a plan may take.
  expect(performance.now() - began).toBeLessThan(10_000);
});

test("a client that hangs up in the middle of its problem harms nobody", async () => {
  const cookie = await member();
  const { hostname, port } = new URL(app.url);
  const socket = connect(Number(port), hostname);
  await new Promise((resolve) => socket.once("connect", resolve));
  const head = [
    "POST /api/plan HTTP/1.1",
    `Host: ${hostname}:${port}`,
    `Cookie: ${cookie}`,
    "Content-Type: application/json",
    "Content-Length: 1000",
  ];
  socket.write(`${head.join("\r\n")}\r\n\r\n{"version":1,`);
  socket.destroy();
  expect((await plan(cookie, JSON.stringify(workedExample))).status).toBe(200);
});
