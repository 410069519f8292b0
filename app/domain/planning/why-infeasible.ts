import type { Reason } from "#app/domain/planning/answer.ts";
import type { Model } from "#app/domain/planning/model.ts";

/** One reason for every song that no guitar can play in any of its ways. */
export function songsWithoutGuitar({ problem, options }: Model): Reason[] {
  return problem.order.flatMap((id, song): Reason[] =>
    options[song]!.length > 0
      ? []
      : [
          {
            code: "no-guitar",
            songs: [id],
            message: `No guitar of this set can be tuned for ${JSON.stringify(id)}.`,
          },
        ],
  );
}
