import { describe, expect, test } from "vitest";
import { type Action, actions, can, type Role, roles } from "#app/domain/permissions.ts";

// The product's own table of roles, cell by cell: there is no outside source for who may do what in an act.
const table: Record<Action, Record<Role, boolean>> = {
  view: { owner: true, performer: true, tech: true, guest: true },
  plan: { owner: true, performer: true, tech: false, guest: false },
  prepare: { owner: true, performer: true, tech: true, guest: false },
  manage: { owner: true, performer: false, tech: false, guest: false },
};

describe("what a role may do", () => {
  for (const action of actions) {
    for (const role of roles) {
      test(`${role} ${table[action][role] ? "may" : "may not"} ${action}`, () => {
        expect(can(role, action)).toBe(table[action][role]);
      });
    }
  }

  test("the table has no action or role besides these", () => {
    expect([...actions].sort()).toEqual(Object.keys(table).sort());
    expect([...roles]).toEqual(["owner", "performer", "tech", "guest"]);
  });
});
