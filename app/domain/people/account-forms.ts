import { z } from "zod";
import { namings } from "#app/domain/music/note-names.ts";
import { roles } from "#app/domain/permissions.ts";

export const accountLimits = { name: 80, email: 254, passwordLeast: 10, passwordMost: 200 } as const;

export const papers = ["a4", "letter"] as const;
export const hands = ["right", "left"] as const;

function name(asked: string) {
  return z
    .string({ error: asked })
    .trim()
    .min(1, asked)
    .max(accountLimits.name, `This is longer than ${accountLimits.name} characters. Shorten it.`);
}

const displayName = () => name("Write the name that your act should see.");
const actName = () => name("Write the name of your act.");

/** An address is compared without regard to capitals, so it is kept in small letters. */
const email = () =>
  z
    .string({ error: "Write your e-mail address." })
    .trim()
    .max(accountLimits.email, `An e-mail address has at most ${accountLimits.email} characters.`)
    .toLowerCase()
    .pipe(z.email("This is not an e-mail address. Write it like name@example.com."));

const newPassword = () =>
  z
    .string({ error: `Choose a password of ${accountLimits.passwordLeast} characters or more.` })
    .min(
      accountLimits.passwordLeast,
      `This password is short. Use ${accountLimits.passwordLeast} characters or more.`,
    )
    .max(accountLimits.passwordMost, `A password has at most ${accountLimits.passwordMost} characters.`);

const knownPassword = (asked: string) =>
  z
    .string({ error: asked })
    .max(accountLimits.passwordMost, `A password has at most ${accountLimits.passwordMost} characters.`);

/**
 * A person who starts an act of their own.
 * @example signUpSchema.parse({ displayName: "Wren", actName: "Emmer", email: "W@x.org", password: "ten letters" })
 * // { displayName: "Wren", actName: "Emmer", email: "w@x.org", password: "ten letters" }
 */
export const signUpSchema = z.object({
  displayName: displayName(),
  actName: actName(),
  email: email(),
  password: newPassword(),
});

/** A person who is asked into an act by a join link. */
export const joinSchema = signUpSchema.omit({ actName: true });

/** Any password is tried at sign-in, also one that could not be chosen today. */
export const signInSchema = z.object({
  email: email(),
  password: knownPassword("Write your password."),
});

/** How a person is named and how Stillpeg shows things to them. */
export const preferencesSchema = z.object({
  displayName: displayName(),
  naming: z.enum(namings, { error: "Choose how notes are named." }),
  paper: z.enum(papers, { error: "Choose a paper." }),
  hand: z.enum(hands, { error: "Choose a hand." }),
});

export const changePasswordSchema = z.object({
  current: knownPassword("Write the password that you have now."),
  password: newPassword(),
});

export const actSchema = z.object({ actName: actName() });

/** Deleting an act is confirmed by writing its name, apart from capitals and outer spaces. */
export function deleteActSchema(actualName: string) {
  const plain = (text: string) => text.trim().toLowerCase();
  const asked = `Write ${actualName} to delete it.`;
  return z.object({
    actName: z.string({ error: asked }).refine((written) => plain(written) === plain(actualName), asked),
  });
}

export const roleSchema = z.object({
  role: z.enum(roles, { error: "Choose a role: owner, performer, tech or guest." }),
});

export const switchActSchema = z.object({ actId: z.string({ error: "Choose an act." }).max(24) });

export const revokeSessionsSchema = z.object({
  session: z.union([z.literal("others"), z.string().regex(/^[0-9a-f]{64}$/)], {
    error: "Choose a sign-in to end.",
  }),
});

export type Preferences = z.output<typeof preferencesSchema>;
export type SignUp = z.output<typeof signUpSchema>;
