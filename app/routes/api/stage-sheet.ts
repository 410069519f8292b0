import { z } from "zod";
import { namings } from "#app/domain/music/note-names.ts";
import { getDb } from "#app/services/db.server.ts";
import { notFound, requireMember } from "#app/services/member.server.ts";
import { gatherStageSheet, renderSheet } from "#app/services/stage-sheet.server.ts";
import { QueueFull } from "#app/services/worker-pool.server.ts";
import type { Route } from "./+types/stage-sheet";

/** What the address may ask for; left out, it is the reader's own. */
const query = z.object({ paper: z.enum(["a4", "letter"]).optional(), naming: z.enum(namings).optional() });

/** The stage sheet as a PDF. Its digest is the ETag: a sheet that says the same is not sent again. */
export async function loader({ context, params, request, url }: Route.LoaderArgs) {
  const member = requireMember(context, url);
  const asked = query.safeParse(Object.fromEntries(url.searchParams));
  if (!asked.success) {
    const message =
      "This sheet comes as ?paper=a4 or letter and ?naming=english, german or fixed-do. Change the address.";
    return new Response(message, { status: 400, headers: { "Content-Type": "text/plain; charset=utf-8" } });
  }
  const { paper = member.paper, naming = member.naming } = asked.data;
  const ready = await gatherStageSheet(getDb(), member, params.gigId, { paper, naming });
  if (!ready) notFound("gig");
  const etag = `"${ready.version}"`;
  const headers = { ETag: etag, "Cache-Control": "private, no-cache" };
  if (request.headers.get("If-None-Match") === etag) return new Response(null, { status: 304, headers });
  try {
    const bytes = await renderSheet(ready, member.actName, new Date());
    return new Response(new Uint8Array(bytes), {
      headers: {
        ...headers,
        "Content-Type": "application/pdf",
        "Content-Disposition": 'inline; filename="stage-sheet.pdf"',
      },
    });
  } catch (error) {
    if (!(error instanceof QueueFull)) throw error;
    return new Response("Many sheets are being printed. Try again in a few seconds.", {
      status: 503,
      headers: { "Retry-After": "5" },
    });
  }
}
