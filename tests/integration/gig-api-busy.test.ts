import { expect, test, vi } from "vitest";
import { QueueFull } from "#app/services/worker-pool.server.ts";
import { ask } from "#tests/support/ask.ts";
import { useDatabase } from "#tests/support/database.ts";
import { makeAct } from "#tests/support/factories.ts";
import { signInAs } from "#tests/support/sign-in.ts";

const solveInPool = vi.hoisted(() => vi.fn());
vi.mock("#app/services/planner-pool.server.ts", () => ({ solveInPool, mostSeconds: 20 }));

const database = useDatabase();

const empty = {
  version: 1,
  crew: "alone",
  times: { string: 8, semitone: 1, capoMove: 6, capoOn: 5, capoOff: 3, swap: 15 },
  aim: { seconds: 0, strings: 0, semitones: 0, capoActions: 0, swaps: 0 },
  guitars: [],
  songs: [],
  order: [],
  rules: { at: {}, before: [], into: [], apart: [] },
  maxMoved: null,
};

async function plan() {
  const wren = await makeAct(database.db);
  const { cookie } = await signInAs(database.db, wren.personId);
  return ask("/api/plan?effort=7", {
    method: "POST",
    cookie,
    body: JSON.stringify(empty),
    headers: { "Content-Type": "application/json" },
  });
}

test("a planner that is full says so, and when to come back", async () => {
  solveInPool.mockRejectedValue(new QueueFull("Too many are waiting. Try again in a few seconds."));
  const answer = await plan();
  expect(answer.status).toBe(429);
  expect(answer.headers.get("Retry-After")).toBe("5");
  expect(JSON.parse(answer.text).message).toContain("Try again");
});

test("the planner is told the effort, and hears when the client goes", async () => {
  solveInPool.mockImplementation(async (_, { signal }) => ({
    answer: { status: "feasible", heard: signal instanceof AbortSignal },
    ended: "time",
  }));
  const answer = await plan();
  expect(JSON.parse(answer.text)).toEqual({ status: "feasible", heard: true });
  expect(answer.headers.get("Plan-Ended")).toBe("time");
  expect(solveInPool.mock.lastCall?.[1]).toMatchObject({ effort: 7 });
});
