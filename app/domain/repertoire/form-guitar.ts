import type { Guitar } from "#app/domain/repertoire/guitar.ts";

/** What the pages of a song need of a guitar. Deleted ones are among them only where the song names them. */
export type FormGuitar = Pick<
  Guitar,
  "id" | "name" | "shortName" | "badge" | "strings" | "usual" | "lowest" | "highest"
> & { deleted: boolean };
