import { describe, expect, test } from "vitest";
import { ask } from "#tests/support/ask.ts";
import { useDatabase } from "#tests/support/database.ts";
import { makeAct } from "#tests/support/factories.ts";
import { signInAs } from "#tests/support/sign-in.ts";

const database = useDatabase();

async function rename(headers: Record<string, string>, path = "/act") {
  const { personId } = await makeAct(database.db);
  const { cookie } = await signInAs(database.db, personId);
  const answer = await ask(path, {
    method: "POST",
    cookie,
    headers: { "Content-Type": "application/x-www-form-urlencoded", ...headers },
    body: "actName=Renamed",
  });
  const act = await database.db("acts").first("name");
  return { status: answer.status, name: act.name, text: answer.text };
}

describe("a post to a page", () => {
  test("from here is taken", async () => {
    expect(await rename({ "Sec-Fetch-Site": "same-origin" })).toMatchObject({ status: 200, name: "Renamed" });
  });

  test("from no browser is taken", async () => {
    expect(await rename({})).toMatchObject({ status: 200, name: "Renamed" });
  });

  test.each([
    [
      "Sec-Fetch-Site says another site",
      { "Sec-Fetch-Site": "cross-site", Origin: "https://elsewhere.example" },
    ],
    ["Origin is foreign", { Origin: "https://elsewhere.example" }],
    ["Origin is hidden", { Origin: "null" }],
  ])("is refused where %s, and changes nothing", async (_, headers) => {
    const answer = await rename(headers);
    expect(answer).toMatchObject({ status: 403, name: "The Emmer Road" });
    expect(answer.text).toContain("This was sent from another site");
  });

  test("is refused for the address that client navigation posts to", async () => {
    const answer = await rename({ Origin: "https://elsewhere.example" }, "/act.data");
    expect(answer.name).toBe("The Emmer Road");
    expect(answer.text).toContain("This was sent from another site");
  });
});

test.each(["/api/plan", "/api/nowhere", "/sign-out", "/sign-in", "/people/links"])(
  "a foreign post to %s is refused",
  async (path) => {
    const answer = await ask(path, { method: "POST", headers: { Origin: "https://elsewhere.example" } });
    expect(answer.status).toBe(403);
  },
);
