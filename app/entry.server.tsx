import { PassThrough } from "node:stream";
import { text } from "node:stream/consumers";
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

/**
 * Renders a page whole: nothing on a page waits for anything but its loader, and one piece compresses and travels
 * better than many.
 */
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
  return new Promise((resolve, reject) => {
    const { pipe, abort } = renderToPipeableStream(
      <NonceProvider value={nonce}>
        <ServerRouter context={routerContext} url={request.url} nonce={nonce} />
      </NonceProvider>,
      {
        nonce,
        onAllReady() {
          clearTimeout(timer);
          text(pipe(new PassThrough())).then(
            (page) => resolve(new Response(page, { status, headers })),
            reject,
          );
        },
        onShellError: reject,
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
