import { describe, expect, test } from "vitest";
import type { z } from "zod";
import {
  changePasswordSchema,
  deleteActSchema,
  joinSchema,
  preferencesSchema,
  revokeSessionsSchema,
  roleSchema,
  signInSchema,
  signUpSchema,
} from "#app/domain/people/account-forms.ts";

const person = { displayName: "Wren", actName: "Emmer", email: "wren@example.test", password: "ten letters" };

function messages(schema: z.ZodType, value: unknown): Record<string, string> {
  const read = schema.safeParse(value);
  return Object.fromEntries((read.error?.issues ?? []).map((issue) => [issue.path.join("."), issue.message]));
}

describe("sign-up", () => {
  test("trims names and writes the address small", () => {
    const typed = { ...person, displayName: "  Wren ", email: " Wren@Example.TEST " };
    expect(signUpSchema.parse(typed)).toEqual(person);
  });

  test("a password keeps its spaces", () => {
    expect(signUpSchema.parse({ ...person, password: "  ten letters " }).password).toBe("  ten letters ");
  });

  test("says what is missing, field by field", () => {
    expect(messages(signUpSchema, {})).toEqual({
      displayName: "Write the name that your act should see.",
      actName: "Write the name of your act.",
      email: "Write your e-mail address.",
      password: "Choose a password of 10 characters or more.",
    });
  });

  test.each([
    ["displayName", "x".repeat(80), "x".repeat(81), "This is longer than 80 characters. Shorten it."],
    ["actName", "x".repeat(80), "x".repeat(81), "This is longer than 80 characters. Shorten it."],
    ["password", "x".repeat(10), "x".repeat(9), "This password is short. Use 10 characters or more."],
    ["password", "x".repeat(200), "x".repeat(201), "A password has at most 200 characters."],
    [
      "email",
      `${"x".repeat(60)}@${"y.".repeat(94)}abcde`,
      `${"x".repeat(60)}@${"y.".repeat(94)}abcdef`,
      "An e-mail address has at most 254 characters.",
    ],
  ])("%s has its limit", (field, fits, tooMuch, message) => {
    const withField = (value: string) => messages(signUpSchema, { ...person, [field]: value })[field];
    // 254 characters is the longest address that fits a mail path (RFC 5321, 4.5.3.1.3, less two angle brackets).
    if (field === "email") expect(fits.length).toBe(254);
    expect(withField(fits)).toBeUndefined();
    expect(withField(tooMuch)).toBe(message);
  });

  test.each(["wren", "wren@", "@example.test", "wren@example", "wren @example.test", "a@b@c.test"])(
    "%s is no e-mail address",
    (email) => {
      expect(messages(signUpSchema, { ...person, email })).toEqual({
        email: "This is not an e-mail address. Write it like name@example.com.",
      });
    },
  );

  test("somebody who joins needs no act", () => {
    const { actName, ...joiner } = person;
    expect(joinSchema.parse(joiner)).toEqual(joiner);
    expect(actName).toBe("Emmer");
  });
});

test("sign-in tries passwords that could not be chosen", () => {
  expect(signInSchema.parse({ email: "wren@example.test", password: "short" }).password).toBe("short");
  expect(messages(signInSchema, { email: "wren@example.test" })).toEqual({
    password: "Write your password.",
  });
});

test("a new password has the limits of a first one", () => {
  expect(messages(changePasswordSchema, { current: "old", password: "short" })).toEqual({
    password: "This password is short. Use 10 characters or more.",
  });
});

test("preferences are from their lists", () => {
  const chosen = { displayName: "Wren", naming: "german", paper: "letter", hand: "left" };
  expect(preferencesSchema.parse(chosen)).toEqual(chosen);
  expect(messages(preferencesSchema, { ...chosen, naming: "dutch", paper: "a5", hand: "both" })).toEqual({
    naming: "Choose how notes are named.",
    paper: "Choose a paper.",
    hand: "Choose a hand.",
  });
});

test("a role is one of the four", () => {
  expect(messages(roleSchema, { role: "admin" })).toEqual({
    role: "Choose a role: owner, performer, tech or guest.",
  });
});

test("an act is deleted by writing its name", () => {
  const schema = deleteActSchema("The Emmer Road");
  expect(schema.safeParse({ actName: " the emmer road " }).success).toBe(true);
  expect(messages(schema, { actName: "The Emmer" })).toEqual({
    actName: "Write The Emmer Road to delete it.",
  });
  expect(messages(schema, {})).toEqual({ actName: "Write The Emmer Road to delete it." });
});

test("a sign-in to end is a hash or all others", () => {
  expect(revokeSessionsSchema.safeParse({ session: "others" }).success).toBe(true);
  expect(revokeSessionsSchema.safeParse({ session: "a".repeat(64) }).success).toBe(true);
  expect(revokeSessionsSchema.safeParse({ session: "' or 1=1" }).success).toBe(false);
});
