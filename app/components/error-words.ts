import { isRouteErrorResponse } from "react-router";

export type ErrorWords = { title: string; message: string; tryAgain: boolean };

const titles: Record<number, string> = {
  400: "This cannot be read",
  403: "Not yours to change",
  404: "Not here",
  503: "Out of reach for a moment",
};

const unexpected: ErrorWords = {
  title: "This did not work",
  message:
    "Something went wrong on our side, and it has been written to the log. Nothing you saved is lost. Try again in a moment.",
  tryAgain: true,
};

const unreachable: ErrorWords = {
  title: "Out of reach for a moment",
  message: "The server cannot be reached. Check the connection, then try again. Nothing you saved is lost.",
  tryAgain: true,
};

/** How browsers say that a request got no answer at all: Chromium, Firefox and Safari, from memory. */
const noAnswer =
  /^(?:Failed to fetch|NetworkError when attempting|Load failed|Importing a module script failed)/;

/**
 * What happened, and whether trying again can help. Only what a route said on purpose reaches a person; anything else
 * is "something went wrong".
 * @example errorWords(new TypeError("Failed to fetch")).message // "The server cannot be reached. …"
 */
export function errorWords(error: unknown): ErrorWords {
  if (!isRouteErrorResponse(error)) {
    return error instanceof Error && noAnswer.test(error.message) ? unreachable : unexpected;
  }
  const title = titles[error.status] ?? unexpected.title;
  const tryAgain = error.status >= 500;
  const said = messageIn(error.data);
  if (said) return { title, message: said, tryAgain };
  if (error.status === 404) return { title, message: "There is nothing at this address.", tryAgain };
  return { ...unexpected, title };
}

/** Whether an error says that the server or its database gave no answer, so that the same can be sent again. */
export function isAway(error: unknown): boolean {
  if (isRouteErrorResponse(error)) return error.status === 503;
  return error instanceof Error && noAnswer.test(error.message);
}

function messageIn(data: unknown): string | null {
  if (typeof data !== "object" || data === null || !("message" in data)) return null;
  return typeof data.message === "string" ? data.message : null;
}
