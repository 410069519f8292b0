import { afterAll, describe, expect, test } from "vitest";
import { evaluate } from "#app/domain/planning/evaluate.ts";
import { parseProblem } from "#app/domain/planning/problem.ts";
import { createCapo } from "#app/models/capos.server.ts";
import { closePlannerPool } from "#app/services/planner-pool.server.ts";
import { ask } from "#tests/support/ask.ts";
import { useDatabase } from "#tests/support/database.ts";
import { makeAct } from "#tests/support/factories.ts";
import { makeGig } from "#tests/support/gigs.ts";
import { workedExample } from "#tests/support/planning-worked-example.ts";
import { createAct } from "#tests/support/repertoire.ts";
import { signInAs } from "#tests/support/sign-in.ts";

const database = useDatabase();
afterAll(closePlannerPool);

async function owner() {
  const wren = await makeAct(database.db);
  const { cookie } = await signInAs(database.db, wren.personId);
  return { wren, cookie };
}

function plan(cookie: string, body: unknown, query = "") {
  return ask(`/api/plan${query}`, {
    method: "POST",
    cookie,
    body: typeof body === "string" ? body : JSON.stringify(body),
    headers: { "Content-Type": "application/json" },
  });
}

describe("GET /api/gigs", () => {
  test("lists the act's gigs with their sets and the number of songs in each", async () => {
    const { wren, cookie } = await owner();
    const { gigId } = await makeGig(database.db, wren);
    await makeGig(database.db, await createAct(database.db, "Others"));
    const answer = await ask("/api/gigs", { cookie });
    expect(JSON.parse(answer.text)).toEqual({
      gigs: [
        {
          id: gigId,
          name: "Spring evening",
          startsAt: "2027-07-02T19:30:00.000Z",
          sets: [
            { id: "s1", name: "Set 1", songs: 3 },
            { id: "s2", name: "Set 2", songs: 0 },
          ],
        },
      ],
    });
  });

  test("answers 401 as JSON without a session", async () => {
    const answer = await ask("/api/gigs");
    expect(answer.status).toBe(401);
    expect(JSON.parse(answer.text).message).toContain("Sign in");
  });
});

describe("GET /api/gigs/:gigId/plan-problem", () => {
  test("is the problem itself, which the planner takes as it is", async () => {
    const { wren, cookie } = await owner();
    const { gigId, gig } = await makeGig(database.db, wren);
    const answer = await ask(`/api/gigs/${gigId}/plan-problem?set=1`, { cookie });
    const parsed = parseProblem(JSON.parse(answer.text));
    expect(parsed.ok).toBe(true);
    if (!parsed.ok) return;
    expect(parsed.problem.order).toEqual(gig.entries.map((entry) => entry.id));
    expect(parsed.problem.times).toMatchObject({ string: 8, semitone: 1, check: 5, swap: 15, cover: 12 });
    expect((await plan(cookie, answer.text)).status).toBe(200);
    const empty = await ask(`/api/gigs/${gigId}/plan-problem?set=2`, { cookie });
    expect(JSON.parse(empty.text)).toMatchObject({ version: 1, songs: [], order: [] });
    const first = await ask(`/api/gigs/${gigId}/plan-problem`, { cookie });
    expect(first.text).toBe(answer.text);
  });

  test("knows the act's capos and the gig's wishes and aim", async () => {
    const { wren, cookie } = await owner();
    await createCapo(database.db, wren, { name: "Steel", strings: null, count: 2 });
    const { gigId, gig } = await makeGig(database.db, wren, {
      aim: { kind: "strings" },
      wishes: [{ kind: "key-apart", seconds: 10 }],
    });
    const answer = await ask(`/api/gigs/${gigId}/plan-problem?set=1`, { cookie });
    const parsed = parseProblem(JSON.parse(answer.text));
    expect(parsed.ok && parsed.problem).toMatchObject({
      capos: [{ strings: [1, 2, 3, 4, 5, 6], count: 2 }],
      wishes: [{ kind: "apart", groups: [gig.entries.map((entry) => entry.id)], seconds: 10 }],
    });
    expect(parsed.ok && parsed.problem.aim.strings).toBeGreaterThan(1000);
    expect((await plan(cookie, answer.text)).status).toBe(200);
  });

  test("answers 404 for an unknown set or another act's gig, 401 without a session", async () => {
    const { wren, cookie } = await owner();
    const { gigId } = await makeGig(database.db, wren);
    const others = await makeGig(database.db, await createAct(database.db, "Others"));
    for (const set of ["3", "0", "-1", "x", "1.5", ""]) {
      const answer = await ask(`/api/gigs/${gigId}/plan-problem?set=${set}`, { cookie });
      expect(answer.status).toBe(404);
      expect(JSON.parse(answer.text).message).toContain("1 to 2");
    }
    expect((await ask(`/api/gigs/${others.gigId}/plan-problem?set=1`, { cookie })).status).toBe(404);
    expect((await ask(`/api/gigs/${gigId}/plan-problem?set=1`)).status).toBe(401);
  });
});

describe("POST /api/plan", () => {
  test("answers a problem with the proven plan, as the format's worked example has it", async () => {
    const { cookie } = await owner();
    const answer = await plan(cookie, workedExample, "?effort=1000");
    expect(answer.status).toBe(200);
    expect(JSON.parse(answer.text)).toMatchObject({
      status: "optimal",
      total: 9,
      bound: 9,
      totals: { exposed: 9, seconds: 21, strings: 1, semitones: 2, capoActions: 1, swaps: 0, moved: 0 },
      order: ["s1", "s2"],
    });
    const again = await plan(cookie, workedExample);
    const { order, plays } = JSON.parse(again.text);
    const parsed = parseProblem(workedExample);
    if (parsed.ok) expect(evaluate(parsed.problem, order, plays).totals.exposed).toBe(9);
  });

  test("answers 200 where there is no plan, and says why", async () => {
    const { cookie } = await owner();
    const answer = await plan(cookie, { ...workedExample, guitars: [] });
    expect(answer.status).toBe(200);
    expect(JSON.parse(answer.text)).toMatchObject({
      status: "infeasible",
      why: [
        { code: "no-guitar", songs: ["s1"] },
        { code: "no-guitar", songs: ["s2"] },
      ],
    });
  });

  test("lists what is wrong with a bad problem, bad JSON and a bad effort", async () => {
    const { cookie } = await owner();
    const bad = async (body: unknown, query = "") => {
      const answer = await plan(cookie, body, query);
      expect(answer.status).toBe(400);
      const { problems } = JSON.parse(answer.text);
      for (const problem of problems) {
        expect(Object.keys(problem).toSorted()).toEqual(["code", "message", "path", "remedy"]);
      }
      return problems;
    };
    expect(await bad({ ...workedExample, version: 2 })).toMatchObject([{ path: "version" }]);
    expect((await bad({ ...workedExample, order: ["s1"], songs: "none" })).length).toBeGreaterThan(0);
    expect(await bad("{half")).toMatchObject([{ code: "json", path: "" }]);
    expect(await bad("")).toMatchObject([{ code: "json" }]);
    for (const effort of ["0", "-1", "1.5", "lots", "1e3", "99999999999"]) {
      expect(await bad(workedExample, `?effort=${effort}`)).toMatchObject([
        { code: "effort", path: "effort" },
      ]);
    }
  });

  test("answers 413 over one megabyte and 401 without a session", async () => {
    const { cookie } = await owner();
    const answer = await plan(cookie, `"${"x".repeat(1024 * 1024)}"`);
    expect(answer.status).toBe(413);
    expect(JSON.parse(answer.text).problems).toHaveLength(1);
    expect((await plan("", workedExample)).status).toBe(401);
    expect((await ask("/api/plan", { cookie })).status).toBe(405);
    expect((await ask("/api/plan")).status).toBe(401);
  });
});
