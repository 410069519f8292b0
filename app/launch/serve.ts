import { createServer } from "node:http";
import { fileURLToPath } from "node:url";
import * as build from "virtual:react-router/server-build";
import { createRequestHandler } from "@react-router/express";
import compression from "compression";
import express, { type ErrorRequestHandler } from "express";
import { RouterContextProvider } from "react-router";
import { clientIpContext } from "#app/services/client-ip.server.ts";
import { closeDb } from "#app/services/db.server.ts";
import { EnvError, getEnv } from "#app/services/env.server.ts";
import { log } from "#app/services/log.server.ts";
import { nonceContext } from "#app/services/nonce.server.ts";
import { closePasswordPool } from "#app/services/password.server.ts";
import { closePlannerPool } from "#app/services/planner-pool.server.ts";
import { closeSheetPool } from "#app/services/stage-sheet.server.ts";
import { nonceOf, securityHeaders } from "./security.ts";

const finishMilliseconds = 1_500;
const closeMilliseconds = 500;
const clientFolder = fileURLToPath(new URL("../client", import.meta.url));

function makeApp(): express.Express {
  const env = getEnv();
  const app = express();
  app.disable("x-powered-by");
  app.set("trust proxy", env.TRUST_PROXY);
  app.use(securityHeaders(env.PUBLIC_URL));
  app.use(
    compression({
      filter: (request, response) => !isEventStream(response) && compression.filter(request, response),
    }),
  );
  // Names in assets/ carry a hash of the content: what one of them holds never changes.
  app.use(
    "/assets",
    express.static(`${clientFolder}/assets`, { immutable: true, maxAge: "1y", fallthrough: false }),
  );
  app.use(express.static(clientFolder, { index: false, maxAge: "1h" }));
  app.all(
    "/{*path}",
    createRequestHandler({
      build,
      getLoadContext(request, response) {
        const context = new RouterContextProvider();
        context.set(nonceContext, nonceOf(response));
        context.set(clientIpContext, request.ip ?? "unknown");
        return context;
      },
    }),
  );
  app.use(lastResort);
  return app;
}

function isEventStream(response: express.Response): boolean {
  return String(response.getHeader("Content-Type") ?? "").startsWith("text/event-stream");
}

/** What went wrong outside any route: an address that is none, a file that is not there. */
const lastResort: ErrorRequestHandler = (error, request, response, next) => {
  if (response.headersSent) return next(error);
  const status = error.code === "ERR_INVALID_URL" ? 400 : Number(error.status ?? 500);
  if (status >= 500)
    log.error({ err: error, method: request.method, path: request.path }, "a request failed");
  response.status(status).type("text/plain").send(wordsFor(status));
};

function wordsFor(status: number): string {
  if (status >= 500) {
    return "Something went wrong on our side, and it has been written to the log. Try again in a moment.";
  }
  return status === 404 ? "There is nothing at this address." : "This address cannot be read.";
}

function serve(): void {
  const { HOST, PORT } = getEnv();
  const server = createServer(makeApp());
  let stopping = false;

  /** Lets what is being answered finish, cuts what never would (event streams), and closes what the pages used. */
  async function stop(): Promise<void> {
    if (stopping) return;
    stopping = true;
    const closed = new Promise<void>((resolve) => server.close(() => resolve()));
    server.closeIdleConnections();
    const cut = setTimeout(() => server.closeAllConnections(), finishMilliseconds);
    await closed;
    clearTimeout(cut);
    setTimeout(() => process.exit(0), closeMilliseconds);
    await Promise.allSettled([closePlannerPool(), closePasswordPool(), closeSheetPool(), closeDb()]);
    process.exit(0);
  }

  server.once("error", (error: NodeJS.ErrnoException) => {
    fail(
      error.code === "EADDRINUSE"
        ? `Port ${PORT} on ${HOST} is already in use.`
        : `Cannot serve: ${error.message}`,
    );
  });
  server.listen(PORT, HOST, () => {
    log.info({ host: HOST, port: PORT }, "serving");
    process.send?.({ kind: "ready" });
  });
  process.on("SIGTERM", stop);
  process.on("SIGINT", stop);
  // The launcher is gone without a word: nobody would ever stop this process.
  process.on("disconnect", stop);
}

function fail(line: string): void {
  process.stderr.write(`${line}\n`);
  process.exit(1);
}

process.on("uncaughtException", (error) => {
  log.fatal({ err: error }, "the server cannot go on");
  process.exit(1);
});

try {
  serve();
} catch (error) {
  if (!(error instanceof EnvError)) throw error;
  fail(error.message);
}
