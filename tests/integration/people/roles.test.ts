import { describe, expect, test } from "vitest";
import type { Role } from "#app/domain/permissions.ts";
import { ask } from "#tests/support/ask.ts";
import { useDatabase } from "#tests/support/database.ts";
import { addPerson, makeAct } from "#tests/support/factories.ts";
import { signInAs } from "#tests/support/sign-in.ts";

const database = useDatabase();

async function actOf(...roles: Role[]) {
  const first = await makeAct(database.db, { role: roles[0] });
  const others = [];
  for (const role of roles.slice(1)) others.push(await addPerson(database.db, first.actId, role));
  const people = [];
  for (const person of [first, ...others]) {
    people.push({ ...person, cookie: (await signInAs(database.db, person.personId)).cookie });
  }
  return { actId: first.actId, people };
}

async function rolesIn(actId: string): Promise<Record<string, Role>> {
  const rows = await database.db("memberships").where({ act_id: actId });
  return Object.fromEntries(rows.map((row) => [row.person_id, row.role]));
}

describe("roles", () => {
  test("are changed by an owner", async () => {
    const { actId, people } = await actOf("owner", "guest");
    const [owner, guest] = people;
    const changed = await ask(`/people/${guest!.personId}/role`, {
      form: { role: "tech" },
      cookie: owner!.cookie,
    });
    expect(changed).toMatchObject({ status: 302, location: "/people" });
    expect((await rolesIn(actId))[guest!.personId]).toBe("tech");
  });

  test.each(["performer", "tech", "guest"] as const)(
    "are not changed by a %s, who sees no button either",
    async (role) => {
      const { actId, people } = await actOf("owner", role);
      const [owner, other] = people;
      const before = await rolesIn(actId);
      for (const target of [owner!, other!]) {
        const answer = await ask(`/people/${target.personId}/role`, {
          form: { role: "owner" },
          cookie: other!.cookie,
        });
        expect(answer.status).toBe(403);
      }
      expect(
        (await ask(`/people/${owner!.personId}/remove`, { form: {}, cookie: other!.cookie })).status,
      ).toBe(403);
      expect(await rolesIn(actId)).toEqual(before);
      const page = await ask("/people", { cookie: other!.cookie });
      expect(page.status).toBe(200);
      expect(page.text).not.toContain("Change role");
      expect(page.text).not.toContain("Remove");
      expect(page.text).toContain("Leave The Emmer Road");
    },
  );

  test("are one of the four", async () => {
    const { actId, people } = await actOf("owner", "guest");
    const [owner, guest] = people;
    const answer = await ask(`/people/${guest!.personId}/role`, {
      form: { role: "admin" },
      cookie: owner!.cookie,
    });
    expect(answer.status).toBe(400);
    expect(answer.text).toContain("Choose a role: owner, performer, tech or guest.");
    expect((await rolesIn(actId))[guest!.personId]).toBe("guest");
  });

  test("count from the next request on", async () => {
    const { people } = await actOf("owner", "owner");
    const [one, other] = people;
    expect((await ask("/act", { cookie: other!.cookie })).status).toBe(200);
    await ask(`/people/${other!.personId}/role`, { form: { role: "guest" }, cookie: one!.cookie });
    expect((await ask("/act", { cookie: other!.cookie })).status).toBe(403);
  });
});

describe("the last owner", () => {
  const refusal = "The Emmer Road would be left without an owner.";

  test("keeps the role, and is told why", async () => {
    const { actId, people } = await actOf("owner", "performer");
    const [owner] = people;
    const answer = await ask(`/people/${owner!.personId}/role`, {
      form: { role: "guest" },
      cookie: owner!.cookie,
    });
    expect(answer.status).toBe(409);
    expect(answer.text).toContain(refusal);
    expect((await rolesIn(actId))[owner!.personId]).toBe("owner");
  });

  test("cannot leave, and is told so before trying", async () => {
    const { actId, people } = await actOf("owner", "performer");
    const [owner] = people;
    const path = `/people/${owner!.personId}/remove`;
    expect((await ask(path, { cookie: owner!.cookie })).text).toContain(refusal);
    const answer = await ask(path, { form: {}, cookie: owner!.cookie });
    expect(answer.status).toBe(409);
    expect(answer.text).toContain(refusal);
    expect(Object.keys(await rolesIn(actId))).toHaveLength(2);
  });

  test("stays where two owners step down at once", async () => {
    for (let round = 0; round < 5; round += 1) {
      const { actId, people } = await actOf("owner", "owner");
      const answers = await Promise.all(
        people.map((one) =>
          ask(`/people/${one.personId}/role`, { form: { role: "guest" }, cookie: one.cookie }),
        ),
      );
      expect(answers.map((answer) => answer.status).sort()).toEqual([302, 409]);
      expect(Object.values(await rolesIn(actId)).sort()).toEqual(["guest", "owner"]);
    }
  });

  test("stays where one owner leaves while the other removes them both ways", async () => {
    const { actId, people } = await actOf("owner", "owner");
    const [one, other] = people;
    await Promise.all([
      ask(`/people/${one!.personId}/remove`, { form: {}, cookie: other!.cookie }),
      ask(`/people/${other!.personId}/remove`, { form: {}, cookie: one!.cookie }),
    ]);
    expect(Object.values(await rolesIn(actId))).toEqual(["owner"]);
  });
});

describe("removing somebody", () => {
  test("asks first, then takes them out of the act", async () => {
    const { actId, people } = await actOf("owner", "performer");
    const [owner, performer] = people;
    const path = `/people/${performer!.personId}/remove`;
    const page = await ask(path, { cookie: owner!.cookie });
    expect(page.text).toContain("will no longer see the gigs, songs and guitars of The Emmer Road");
    expect(await ask(path, { form: {}, cookie: owner!.cookie })).toMatchObject({
      status: 302,
      location: "/people",
    });
    expect(Object.keys(await rolesIn(actId))).toEqual([owner!.personId]);
    expect(await ask("/people", { cookie: performer!.cookie })).toMatchObject({ location: "/act/new" });
  });

  test("anybody may leave", async () => {
    const { actId, people } = await actOf("owner", "guest");
    const [owner, guest] = people;
    await ask(`/people/${guest!.personId}/remove`, { form: {}, cookie: guest!.cookie });
    expect(Object.keys(await rolesIn(actId))).toEqual([owner!.personId]);
  });
});

test("people of another act are not there, whatever one may do in one's own", async () => {
  const { people } = await actOf("owner", "guest");
  const elsewhere = await actOf("owner", "guest");
  const cookie = people[0]!.cookie;
  const stranger = elsewhere.people[1]!;
  const before = await rolesIn(elsewhere.actId);
  expect((await ask(`/people/${stranger.personId}/role`, { cookie })).status).toBe(404);
  expect((await ask(`/people/${stranger.personId}/role`, { form: { role: "owner" }, cookie })).status).toBe(
    404,
  );
  expect((await ask(`/people/${stranger.personId}/remove`, { cookie })).status).toBe(404);
  expect((await ask(`/people/${stranger.personId}/remove`, { form: {}, cookie })).status).toBe(404);
  expect(await rolesIn(elsewhere.actId)).toEqual(before);
});
