const message =
  "The database is not answering right now. Nothing was changed. Keep this page open and try again in a few seconds.";

/**
 * Thrown where a query could not be run because the database is away, full or held up. It is a Response, so that
 * whatever route it surfaces in answers 503 with these words; `cause` is for the log alone.
 */
export class DatabaseUnavailable extends Response {
  readonly name = "DatabaseUnavailable";
  readonly message = message;
  readonly cause: unknown;

  constructor(cause: unknown) {
    super(JSON.stringify({ message }), {
      status: 503,
      headers: { "Content-Type": "application/json", "Retry-After": "3" },
    });
    this.cause = cause;
  }
}

const awayCodes = new Set([
  "ECONNREFUSED",
  "ECONNRESET",
  "ENOENT",
  "EPIPE",
  "ETIMEDOUT",
  "PROTOCOL_CONNECTION_LOST",
  "ER_CON_COUNT_ERROR",
  "ER_CONNECTION_KILLED",
  "ER_SERVER_SHUTDOWN",
  "ER_LOCK_WAIT_TIMEOUT",
  "ER_QUERY_INTERRUPTED",
]);

/** Whether an error of Knex or the driver says that the database is away or busy, rather than that a query is wrong. */
export function isDatabaseAway(error: unknown): boolean {
  if (!(error instanceof Error)) return false;
  if (error.name === "KnexTimeoutError") return true;
  if ("code" in error && typeof error.code === "string") return awayCodes.has(error.code);
  // The driver gives no code to what is sent over a connection that has just been closed.
  return /closed state|connection lost/i.test(error.message);
}
