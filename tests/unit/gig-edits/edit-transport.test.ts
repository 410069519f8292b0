import { afterEach, describe, expect, it, vi } from "vitest";
import { httpTransport } from "#app/components/gig/edits/edit-transport.ts";

const request = { batches: [], since: 3 };

function answering(status: number, body: unknown) {
  const fetching = vi.fn(async (_address: string, _init?: RequestInit) => Response.json(body, { status }));
  vi.stubGlobal("fetch", fetching);
  return fetching;
}

afterEach(() => vi.unstubAllGlobals());

describe("edits over HTTP", () => {
  it("go to the gig's address, and say whose they are", async () => {
    const fetching = answering(200, { revision: 3, results: [], since: [], more: false });
    const { send, news } = httpTransport("g 1", "wren");
    expect(await send(request)).toEqual({
      kind: "answer",
      answer: { revision: 3, results: [], since: [], more: false },
    });
    const [address, init] = fetching.mock.calls[0]!;
    expect(address).toBe("/gigs/g%201/edits");
    expect(JSON.parse(String(init?.body))).toEqual({ batches: [], since: 3, person: "wren" });
    expect(init?.keepalive).toBe(true);
    await news(3);
    expect(fetching.mock.calls[1]![0]).toBe("/gigs/g%201/edits?since=3&person=wren");
  });

  it.each([500, 502, 503, 429])("are tried again after %i", async (status) => {
    answering(status, { message: "busy" });
    expect(await httpTransport("g1", "wren").send(request)).toEqual({ kind: "away" });
  });

  it("are tried again after no answer, or one that is no JSON", async () => {
    vi.stubGlobal("fetch", async () => {
      throw new TypeError("Failed to fetch");
    });
    expect(await httpTransport("g1", "wren").send(request)).toEqual({ kind: "away" });
    vi.stubGlobal("fetch", async () => new Response("<html>proxy</html>"));
    expect(await httpTransport("g1", "wren").send(request)).toEqual({ kind: "away" });
  });

  it("wait for signing in, and end with the gig", async () => {
    answering(401, { message: "Sign in first." });
    expect(await httpTransport("g1", "wren").send(request)).toEqual({ kind: "sign-in" });
    answering(404, { message: "There is no such gig." });
    expect(await httpTransport("g1", "wren").news(3)).toEqual({ kind: "gone" });
  });

  it("are given up where the server names what is wrong", async () => {
    answering(400, {
      problems: [{ path: "batches.2.edits.0.value", message: "The name is empty. Write one." }],
    });
    expect(await httpTransport("g1", "wren").send(request)).toEqual({
      kind: "rejected",
      message: "The name is empty. Write one.",
      index: 2,
    });
    answering(403, { message: "Your role may look at gigs, but not change them." });
    expect(await httpTransport("g1", "wren").send(request)).toEqual({
      kind: "rejected",
      message: "Your role may look at gigs, but not change them.",
      index: null,
    });
  });

  it("that are too long to outlive the page are sent all the same", async () => {
    const fetching = answering(200, {});
    const label = "x".repeat(70_000);
    const batch = { id: "b", client: "c", on: 0, label, undoes: null, edits: [] };
    await httpTransport("g1", "wren").send({ batches: [batch], since: 0 });
    expect(fetching.mock.calls[0]![1]?.keepalive).toBe(false);
  });
});
