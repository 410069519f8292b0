import { getDb } from "#app/services/db.server.ts";

/** Whether the server and its database answer. Asked by whoever watches over an installation; needs no session. */
export async function loader() {
  const started = performance.now();
  const [rows] = await getDb().raw("select version() as version");
  const milliseconds = Math.round(performance.now() - started);
  return Response.json(
    { status: "ok", database: { version: String(rows[0].version), milliseconds } },
    { headers: { "Cache-Control": "no-store" } },
  );
}
