import { PassThrough } from "node:stream";
import { createReadableStreamFromReadable } from "@react-router/node";
import { isbot } from "isbot";
import { renderToPipeableStream } from "react-dom/server";
import {
  type EntryContext,
  type HandleErrorFunction,
  type RouterContextProvider,
  ServerRouter,
} from "react-router";
import { NonceProvider } from "#app/components/nonce.tsx";
import { log } from "#app/services/log.server.ts";
import { nonceContext } from "#app/services/nonce.server.ts";

export const streamTimeout = 5_000;

/** Renders a page as a stream; readers that do not wait for the rest, as crawlers do not, get all of it at once. */
export default function handleRequest(
  request: Request,
  status: number,
  headers: Headers,
  routerContext: EntryContext,
  loadContext: Readonly<RouterContextProvider>,
): Promise<Response> | Response {
  headers.set("Content-Type", "text/html; charset=utf-8");
  if (!headers.has("Cache-Control")) headers.set("Cache-Control", "private, no-cache");
  if (status === 503) headers.set("Retry-After", "3");
  if (request.method === "HEAD") return new Response(null, { status, headers });
  const nonce = loadContext.get(nonceContext) ?? undefined;
  const whole = isbot(request.headers.get("User-Agent") ?? "");
  return new Promise((resolve, reject) => {
    let answered = false;
    const send = () => {
      answered = true;
      const body = new PassThrough({
        final(done) {
          clearTimeout(timer);
          done();
        },
      });
      pipe(body);
      resolve(new Response(createReadableStreamFromReadable(body), { status, headers }));
    };
    const { pipe, abort } = renderToPipeableStream(
      <NonceProvider value={nonce}>
        <ServerRouter context={routerContext} url={request.url} nonce={nonce} />
      </NonceProvider>,
      {
        nonce,
        [whole ? "onAllReady" : "onShellReady"]: send,
        onShellError: reject,
        onError(error) {
          // Before the shell is out, the error reaches handleError by itself.
          if (answered && !request.signal.aborted)
            log.error({ err: error }, "a page could not be rendered whole");
        },
      },
    );
    const timer = setTimeout(abort, streamTimeout + 1_000);
  });
}

/** What no route expected: into the log, with the address it happened at. The page shows none of it. */
export const handleError: HandleErrorFunction = (error, { request }) => {
  if (request.signal.aborted) return;
  const { pathname } = new URL(request.url);
  log.error({ err: error, method: request.method, path: pathname }, "a request failed");
};
