import type { ClientActionFunctionArgs, ShouldRevalidateFunctionArgs } from "react-router";
import { errorWords, isAway } from "#app/components/error-words.ts";

/*
 * For pages with a form: where the server or its database is away, the page stays as it is with what was typed, and says why.
 * A page takes part by exporting `clientAction` and `shouldRevalidate` from here.
 */

let notice: string | null = null;
const listeners = new Set<() => void>();

function say(words: string | null): void {
  notice = words;
  for (const listener of listeners) listener();
}

/** What the last form could not be sent for, in words; `null` where it was sent. A store for `useSyncExternalStore`. */
export const awayNotice = {
  subscribe(listener: () => void): () => void {
    listeners.add(listener);
    return () => listeners.delete(listener);
  },
  read: () => notice,
  clear: () => say(null),
};

type Args = ClientActionFunctionArgs & { serverAction: <T = unknown>() => Promise<T> };

/** Sends the form to the page's action. What that answers is typed by the action itself. */
export async function clientAction({ serverAction }: Args): Promise<undefined> {
  say(null);
  try {
    return await serverAction<undefined>();
  } catch (error) {
    if (!isAway(error)) throw error;
    say(errorWords(error).message);
    return undefined;
  }
}

/** A form that could not be sent changed nothing, and loading the page anew would fail too. */
export function shouldRevalidate({ formMethod, defaultShouldRevalidate }: ShouldRevalidateFunctionArgs) {
  const sent = formMethod !== undefined && formMethod !== "GET";
  return sent && notice !== null ? false : defaultShouldRevalidate;
}
