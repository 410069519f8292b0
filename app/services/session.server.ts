import { createHash, randomBytes } from "node:crypto";
import {
  type Cookie,
  createContext,
  createCookie,
  createSessionStorage,
  type SessionStorage,
} from "react-router";
import {
  deleteExpiredSessions,
  deleteSession,
  findSession,
  insertSession,
  prolongSession,
  revokeOtherSessions,
  revokeSession,
  type SessionData,
  updateSession,
} from "#app/models/sessions.server.ts";
import { getDb } from "#app/services/db.server.ts";
import { getEnv } from "#app/services/env.server.ts";

export const sessionDays = 30;
const sessionSeconds = sessionDays * 24 * 3600;
const prolongEvery = 3600 * 1000;

type Kept = SessionData & { personId: string };
type Storage = SessionStorage<Kept>;

/** The hash of the session that a request came with; null without one. It names the session without opening it. */
export const sessionHashContext = createContext<string | null>(null);

/** Only the hash of a session's id is kept: a copy of the table signs nobody in. */
export function sessionHash(id: string): string {
  return createHash("sha256").update(id).digest("hex");
}

/** `__Host-` binds the cookie to this very host over TLS; without TLS a browser would refuse it. */
export function sessionCookie(): Cookie {
  const { PUBLIC_URL, SESSION_SECRET } = getEnv();
  const secure = PUBLIC_URL.startsWith("https:");
  return createCookie(secure ? "__Host-stillpeg" : "stillpeg", {
    httpOnly: true,
    sameSite: "lax",
    path: "/",
    secure,
    maxAge: sessionSeconds,
    secrets: [SESSION_SECRET],
  });
}

function expiry(): Date {
  return new Date(Date.now() + sessionSeconds * 1000);
}

function storage(): Storage {
  const db = getDb();
  return createSessionStorage<Kept>({
    cookie: sessionCookie(),
    async createData(kept) {
      const id = randomBytes(32).toString("base64url");
      await insertSession(db, { idHash: sessionHash(id), ...divide(kept), expiresAt: expiry() });
      return id;
    },
    async readData(id) {
      const found = await findSession(db, sessionHash(id), new Date());
      return found ? { ...found.data, personId: found.personId } : null;
    },
    async updateData(id, kept) {
      await updateSession(db, sessionHash(id), divide(kept).data, expiry());
    },
    async deleteData(id) {
      await deleteSession(db, sessionHash(id));
    },
  });
}

function divide({ personId, ...data }: Partial<Kept>): { personId: string; data: SessionData } {
  if (!personId) throw new Error("A session belongs to a person.");
  return { personId, data: { ...data, seenAt: data.seenAt ?? new Date().toISOString() } };
}

/** The session that a request came with; without `personId` where it has none that is still good. */
export function readSession(request: Request) {
  return storage().getSession(request.headers.get("Cookie"));
}

/**
 * Signs a person in: the Set-Cookie of a new session. The one they came with ends, so an id that somebody else has
 * planted or seen is worth nothing after sign-in.
 */
export async function startSession(request: Request, personId: string, actId?: string): Promise<string> {
  await endSession(request);
  await deleteExpiredSessions(getDb(), new Date());
  const sessions = storage();
  const session = await sessions.getSession();
  session.set("personId", personId);
  session.set("seenAt", new Date().toISOString());
  session.set("agent", (request.headers.get("User-Agent") ?? "").slice(0, 300));
  if (actId) session.set("actId", actId);
  return sessions.commitSession(session);
}

/** Ends the session that a request came with: the Set-Cookie that takes the cookie away. */
export async function endSession(request: Request): Promise<string> {
  const sessions = storage();
  return sessions.destroySession(await sessions.getSession(request.headers.get("Cookie")));
}

/** Remembers the act that the person looks at now: the Set-Cookie. */
export async function rememberAct(request: Request, actId: string): Promise<string> {
  const sessions = storage();
  const session = await sessions.getSession(request.headers.get("Cookie"));
  session.set("actId", actId);
  return sessions.commitSession(session);
}

/** Ends one of a person's sessions, or all but the one that is kept (all of them where that is null). */
export async function revokeSessions(
  personId: string,
  which: string,
  keptHash: string | null,
): Promise<void> {
  if (which === "others") await revokeOtherSessions(getDb(), personId, keptHash ?? "");
  else await revokeSession(getDb(), personId, which);
}

/** Lets a session in use live on: the Set-Cookie, at most once an hour; null in between. */
export async function prolong(id: string, seenAt: string): Promise<string | null> {
  const now = new Date();
  if (now.getTime() - Date.parse(seenAt) < prolongEvery) return null;
  await prolongSession(getDb(), sessionHash(id), now, expiry());
  return sessionCookie().serialize(id);
}
