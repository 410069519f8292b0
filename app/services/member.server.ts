import { createContext, data, type RouterContextProvider, redirect } from "react-router";
import type { Naming } from "#app/domain/music/note-names.ts";
import { type Action, can, type Role } from "#app/domain/permissions.ts";

/** The signed-in person in the act they are looking at. Every finder takes it: the look-up is the authorisation. */
export type Member = {
  personId: string;
  displayName: string;
  email: string;
  actId: string;
  actName: string;
  role: Role;
  naming: Naming;
  paper: "a4" | "letter";
  hand: "left" | "right";
  /** Every act this person belongs to, by name. */
  acts: { id: string; name: string; role: Role }[];
};

/** The signed-in person, in whatever act. */
export type Person = Omit<Member, "personId" | "actId" | "actName" | "role" | "acts"> & { id: string };

/** Set once by the root middleware; null for strangers. */
export const personContext = createContext<Person | null>(null);

/** Set once by the root middleware; null for strangers and for people who belong to no act. */
export const memberContext = createContext<Member | null>(null);

type Context = Readonly<RouterContextProvider>;

/** The signed-in person, or a redirect to sign-in that comes back to this address. For pages without an act. */
export function requirePerson(context: Context, url: URL): Person {
  const person = context.get(personContext);
  if (!person) throw redirect(`/sign-in?to=${encodeURIComponent(url.pathname + url.search)}`);
  return person;
}

/** The member, or a redirect: to sign-in for strangers, to making an act for a person who belongs to none. For pages. */
export function requireMember(context: Context, url: URL): Member {
  requirePerson(context, url);
  const member = context.get(memberContext);
  if (!member) throw redirect("/act/new");
  return member;
}

/** The member, or 401 as JSON. For API routes. */
export function requireApiMember(context: Context): Member {
  const member = context.get(memberContext);
  if (member) return member;
  if (context.get(personContext)) {
    throw Response.json(
      { message: "You belong to no act. Make one, or ask for a join link." },
      { status: 403 },
    );
  }
  throw Response.json({ message: "Sign in first: this address needs a session." }, { status: 401 });
}

/** Throws 403 where the member's role may not do this. */
export function requireCan(member: Member, action: Action): void {
  if (!can(member.role, action)) {
    throw data(
      { message: `Your role in ${member.actName} (${member.role}) may not do this. Ask an owner.` },
      { status: 403 },
    );
  }
}

/** What a finder's empty hand means to a page: 404, with the same words for what is gone and what is another act's. */
export function notFound(what: string): never {
  throw data({ message: `There is no such ${what} in this act. It may have been deleted.` }, { status: 404 });
}
