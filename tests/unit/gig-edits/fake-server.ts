import type { EditsAnswer, EditsRequest, GigNews } from "#app/components/gig/edits/edit-queue-answers.ts";
import type { LoggedBatch } from "#app/domain/gig/edit.ts";
import { conflictReport, goneReport, type RepertoireNames } from "#app/domain/gig/edit-words.ts";
import type { Gig } from "#app/domain/gig/gig.ts";
import { judgeBatch, type Sender } from "#app/domain/gig/judge-batch.ts";

export const names: RepertoireNames = {
  song: (id) => id.replace("song-", "Song "),
  guitar: (id) => (id === "alder" ? "Alder" : "Birch"),
  neck: (_, id) => id,
};

export const people = {
  wren: { personId: "wren", displayName: "Wren Halloway", role: "owner", actName: "The Emmer Road" },
  ivo: { personId: "ivo", displayName: "Ivo Tarrant", role: "performer", actName: "The Emmer Road" },
} as const satisfies Record<string, Sender>;

/** The server of the edits without its database: the same judge, with the log in memory. */
export function fakeServer(first: Gig) {
  let gig = first;
  const log: LoggedBatch[] = [];
  const news = (since: number): GigNews => ({
    revision: gig.revision,
    batches: log.filter((one) => one.revision > since),
    more: false,
  });
  return {
    gig: () => gig,
    log: () => [...log],
    news,
    send: (request: EditsRequest, sender: Sender): EditsAnswer => {
      const results = request.batches.map((batch): EditsAnswer["results"][number] => {
        const known = new Map(log.map((one) => [one.id, one]));
        const verdict = judgeBatch({ gig, log, known }, batch, sender);
        const { id } = batch;
        if (verdict.status === "known") return { id, status: "applied", revision: verdict.revision };
        if (verdict.status === "refused") return { id, status: "refused", message: verdict.message };
        if (verdict.status === "applied") {
          gig = verdict.gig;
          log.push(verdict.logged);
          return { id, status: "applied", revision: verdict.logged.revision };
        }
        const spoken = { gig, log, names };
        const conflicts = verdict.clashes.map((clash) => conflictReport(clash, spoken));
        if (verdict.failed) conflicts.push(goneReport(verdict.failed.key, spoken));
        return { id, status: "conflict", conflicts };
      });
      const { batches, ...rest } = news(request.since);
      return { ...rest, results, since: batches };
    },
  };
}

export type FakeServer = ReturnType<typeof fakeServer>;
