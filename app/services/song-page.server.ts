import type { Knex } from "knex";
import type { FormGuitar } from "#app/domain/repertoire/form-guitar.ts";
import type { Song } from "#app/domain/repertoire/song.ts";
import { listGuitarsEver } from "#app/models/guitars.server.ts";

/** The guitars that the page of a song tells about: the act's own, and deleted ones where the song is kept to them. */
export async function songGuitars(
  db: Knex,
  member: { actId: string },
  song: Song | null,
): Promise<FormGuitar[]> {
  const named = new Set(song?.necks.flatMap((neck) => neck.guitars ?? []));
  const guitars = await listGuitarsEver(db, member);
  return guitars
    .filter((guitar) => !guitar.deleted || named.has(guitar.id))
    .map(({ id, name, shortName, badge, strings, usual, lowest, highest, deleted }) => {
      return {
        id,
        name,
        shortName,
        badge,
        strings,
        usual,
        lowest,
        highest,
        deleted,
      };
    });
}
