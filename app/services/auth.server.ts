import { Authenticator } from "remix-auth";
import { FormStrategy } from "remix-auth-form";
import type { SignUp } from "#app/domain/people/account-forms.ts";
import { createAct } from "#app/models/acts.server.ts";
import { type JoinOutcome, takeJoinLink } from "#app/models/join-links.server.ts";
import { addMembership } from "#app/models/memberships.server.ts";
import {
  createPerson,
  findPasswordHash,
  findPasswordHashOf,
  updatePasswordHash,
} from "#app/models/people.server.ts";
import { getDb, transact } from "#app/services/db.server.ts";
import { hashPassword, isPassword } from "#app/services/password.server.ts";
import { countTry, forgetTries, waitWords } from "#app/services/rate-limit.server.ts";
import { rememberAct, revokeSessions, startSession } from "#app/services/session.server.ts";

type Refused<Field extends string> = { refused: string; status: 400 | 409 | 410 | 429; field?: Field };

/** Who signed in or up, or why not, in words for the form. */
export type Entry = { personId: string; actId?: string } | Refused<"email">;

const wrong = "No account has this e-mail address and password. Check both, or sign up.";

function tooMany(seconds: number): Refused<never> {
  return { refused: `That was too many tries. Wait ${waitWords(seconds)}, then try again.`, status: 429 };
}

async function checkSignIn(form: FormData, ip: string): Promise<Entry> {
  const email = String(form.get("email") ?? "")
    .trim()
    .toLowerCase();
  const password = String(form.get("password") ?? "");
  const wait = (await countTry("sign-in", ip, email)) ?? (await countTry("sign-in-place", ip));
  if (wait !== null) return tooMany(wait);
  const known = await findPasswordHash(getDb(), email);
  const right = await isPassword(password, known?.passwordHash ?? null);
  if (!right || !known) return { refused: wrong, status: 400 };
  await forgetTries("sign-in", ip, email);
  return { personId: known.personId };
}

/** Reads e-mail and password from a sign-in form that has been found well-formed. */
export function signIn(request: Request, ip: string): Promise<Entry> {
  return new Authenticator<Entry>()
    .use(new FormStrategy(({ form }) => checkSignIn(form, ip)))
    .authenticate("form", request);
}

const taken: Entry = {
  refused: "This e-mail address has an account. Sign in with it instead.",
  status: 409,
  field: "email",
};

/** A new person with an act of their own, or neither. */
export async function signUp(form: SignUp, ip: string): Promise<Entry> {
  const wait = await countTry("sign-up-place", ip);
  if (wait !== null) return tooMany(wait);
  const passwordHash = await hashPassword(form.password);
  return transact(getDb(), async (trx) => {
    const personId = await createPerson(trx, { ...form, passwordHash });
    if (!personId) return taken;
    const actId = await createAct(trx, form.actName);
    await addMembership(trx, actId, personId, "owner");
    return { personId, actId };
  });
}

/** A new person in the act that a join link leads to, or neither. */
export async function signUpToJoin(form: Omit<SignUp, "actName">, token: string, ip: string): Promise<Entry> {
  const wait = await countTry("sign-up-place", ip);
  if (wait !== null) return tooMany(wait);
  const passwordHash = await hashPassword(form.password);
  try {
    return await transact(getDb(), async (trx) => {
      const personId = await createPerson(trx, { ...form, passwordHash });
      if (!personId) return taken;
      const { outcome, actId } = await takeJoinLink(trx, token, personId, new Date());
      if (outcome !== "joined" || !actId) throw new LinkRefused(outcome);
      return { personId, actId };
    });
  } catch (error) {
    if (error instanceof LinkRefused) return { refused: linkWords[error.outcome], status: 410 };
    throw error;
  }
}

/** Takes somebody who is signed in into the act that a join link leads to: the Set-Cookie that shows it; null if it cannot. */
export async function joinAct(request: Request, personId: string, token: string): Promise<string | null> {
  const { actId } = await transact(getDb(), (trx) => takeJoinLink(trx, token, personId, new Date()));
  return actId && rememberAct(request, actId);
}

/** Starts an act with this person as its owner and opens it: the Set-Cookie that shows it. */
export async function startAct(request: Request, personId: string, name: string): Promise<string> {
  const actId = await transact(getDb(), async (trx) => {
    const id = await createAct(trx, name);
    await addMembership(trx, id, personId, "owner");
    return id;
  });
  return rememberAct(request, actId);
}

type PasswordChange = { cookie: string } | Refused<"current">;

/** Changes a password for somebody who knows the old one, and ends every session but a fresh one. */
export async function changePassword(
  request: Request,
  member: { personId: string; actId: string },
  form: { current: string; password: string },
): Promise<PasswordChange> {
  const wait = await countTry("password", member.personId);
  if (wait !== null) return tooMany(wait);
  const hash = await findPasswordHashOf(getDb(), member.personId);
  if (!(await isPassword(form.current, hash))) {
    return { refused: "This is not the password that you have now.", status: 400, field: "current" };
  }
  await forgetTries("password", member.personId);
  await updatePasswordHash(getDb(), member.personId, await hashPassword(form.password));
  await revokeSessions(member.personId, "others", null);
  return { cookie: await startSession(request, member.personId, member.actId) };
}

/** Rolls the new person back where the link does not let them in. */
class LinkRefused extends Error {
  constructor(readonly outcome: JoinOutcome) {
    super(outcome);
  }
}

const ask = "Ask an owner of the act for a new one.";

/** What became of a join link, in words. */
export const linkWords: Record<JoinOutcome, string> = {
  joined: "You are in.",
  already: "You are in this act already.",
  used: `This link has been used. Each link lets in one person. ${ask}`,
  expired: `This link has expired. Links work for 7 days. ${ask}`,
  revoked: `This link has been taken back by the act. ${ask}`,
  unknown: `There is no such link. Check that all of it was copied, or ask for a new one.`,
};
