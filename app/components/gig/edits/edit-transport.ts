import type { EditsAnswer, EditsRequest, GigNews } from "#app/components/gig/edits/edit-queue-answers.ts";

/** What came back from the server, or why nothing did. */
export type Reply<Answer> =
  | { kind: "answer"; answer: Answer }
  /** No connection, no server, or one that is busy: try again later. */
  | { kind: "away" }
  | { kind: "sign-in" }
  | { kind: "gone" }
  /** The server will not take this request, however often it is sent; `index` names the batch at fault. */
  | { kind: "rejected"; message: string; index: number | null };

export type EditTransport = {
  send: (request: EditsRequest) => Promise<Reply<EditsAnswer>>;
  news: (since: number) => Promise<Reply<GigNews>>;
};

const patience = 15_000;

/** What a browser sends to its end although the page is closed meanwhile; more of it fails at once. */
const outlivesPage = 60_000;

/**
 * Edits of one gig over HTTP. They carry whose they are, so that what one person left waiting is not sent as another's
 * who has signed in since.
 */
export function httpTransport(gigId: string, personId: string): EditTransport {
  const address = `/gigs/${encodeURIComponent(gigId)}/edits`;
  return {
    send: (request) => {
      const body = JSON.stringify({ ...request, person: personId });
      const headers = { "Content-Type": "application/json" };
      return ask<EditsAnswer>(address, {
        method: "POST",
        headers,
        body,
        keepalive: body.length < outlivesPage,
      });
    },
    news: (since) => ask<GigNews>(`${address}?since=${since}&person=${encodeURIComponent(personId)}`, {}),
  };
}

async function ask<Answer>(address: string, init: RequestInit): Promise<Reply<Answer>> {
  let response: Response;
  let body: unknown;
  try {
    response = await fetch(address, { ...init, signal: AbortSignal.timeout(patience) });
    body = await response.json();
  } catch {
    // No connection, no answer in time, or an answer that broke off: each is cured by asking again.
    return { kind: "away" };
  }
  if (response.ok) return { kind: "answer", answer: body as Answer };
  if (response.status === 401) return { kind: "sign-in" };
  if (response.status === 404) return { kind: "gone" };
  if ([400, 403, 405, 413].includes(response.status)) return { kind: "rejected", ...refusalIn(body) };
  return { kind: "away" };
}

function refusalIn(body: unknown): { message: string; index: number | null } {
  const { message, problems } = body as { message?: string; problems?: { path: string; message: string }[] };
  const first = problems?.[0];
  const index = /^batches\.(\d+)/.exec(first?.path ?? "")?.[1];
  return {
    message: first?.message ?? message ?? "The server did not take this edit.",
    index: index === undefined ? null : Number(index),
  };
}
