import type { Knex } from "knex";
import type { Repertoire } from "#app/domain/gig/repertoire.ts";
import { listCapos } from "#app/models/capos.server.ts";
import { listGuitars } from "#app/models/guitars.server.ts";
import { listSongsEver } from "#app/models/songs.server.ts";

/** All that a gig is planned from: the act's songs (deleted ones too, since sets keep them), guitars and capos. */
export async function loadRepertoire(db: Knex, member: { actId: string }): Promise<Repertoire> {
  const [songs, guitars, capos] = await Promise.all([
    listSongsEver(db, member),
    listGuitars(db, member),
    listCapos(db, member),
  ]);
  return { songs, guitars, capos };
}
