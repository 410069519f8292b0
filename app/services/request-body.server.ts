/** What a request may hold at most on the API: 1 MB. */
export const bodyLimit = 1024 * 1024;

/** The JSON of a request, or why there is none: it is too long, or no JSON (with the parser's words for where). */
export type JsonBody = { ok: true; value: unknown } | { ok: false; status: 413 | 400; message: string };

/**
 * Reads a request as JSON and stops as soon as it is longer than the limit, so that a stream without end cannot fill
 * the memory.
 */
export async function readJsonBody(request: Request, limit = bodyLimit): Promise<JsonBody> {
  const tooLong = {
    ok: false,
    status: 413,
    message: `This is more than ${limit / 1024 / 1024} MB. Send less at once.`,
  } as const;
  if (Number(request.headers.get("Content-Length") ?? 0) > limit) return tooLong;
  const chunks: Uint8Array[] = [];
  let length = 0;
  for await (const chunk of request.body ?? []) {
    length += chunk.byteLength;
    if (length > limit) return tooLong;
    chunks.push(chunk);
  }
  try {
    const text = new TextDecoder("utf-8", { fatal: true }).decode(Buffer.concat(chunks));
    return { ok: true, value: JSON.parse(text) };
  } catch (error) {
    const why = error instanceof SyntaxError ? error.message : "it is not UTF-8";
    return { ok: false, status: 400, message: `This is not JSON: ${why}.` };
  }
}
