import { data, type MiddlewareFunction } from "react-router";
import { getEnv } from "#app/services/env.server.ts";

const reading = new Set(["GET", "HEAD", "OPTIONS"]);

/**
 * Whether a request that changes something may come from where it says. Stops another site from posting with the
 * cookies of somebody who is signed in here. Browsers say where a request comes from in Sec-Fetch-Site, older ones in
 * Origin; what sends neither is no browser and carries nobody's cookies.
 */
export function isOwnRequest(request: Request, publicUrl: string): boolean {
  if (reading.has(request.method)) return true;
  const site = request.headers.get("Sec-Fetch-Site");
  if (site === "same-origin" || site === "none") return true;
  const origin = request.headers.get("Origin");
  if (origin === null) return site === null;
  if (!URL.canParse(origin)) return false;
  const from = new URL(origin);
  return from.origin === new URL(publicUrl).origin || from.host === new URL(request.url).host;
}

export const csrfMiddleware: MiddlewareFunction<Response> = ({ request }) => {
  if (isOwnRequest(request, getEnv().PUBLIC_URL)) return;
  throw data(
    {
      message:
        "This was sent from another site, so nothing was changed. Open Stillpeg itself and try again there.",
    },
    { status: 403 },
  );
};
