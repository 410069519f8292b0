import { BottomActions } from "#app/components/bottom-actions.tsx";
import { CapoList } from "#app/components/guitars/capo-list.tsx";
import { GuitarList } from "#app/components/guitars/guitar-list.tsx";
import { ButtonLink } from "#app/components/ui/button.tsx";
import { EmptyState, PageHead } from "#app/components/ui/page.tsx";
import { UndoBar } from "#app/components/undo-bar.tsx";
import { can } from "#app/domain/permissions.ts";
import { findCapo, listCapos } from "#app/models/capos.server.ts";
import { findGuitar, listGuitars } from "#app/models/guitars.server.ts";
import { getDb } from "#app/services/db.server.ts";
import { requireMember } from "#app/services/member.server.ts";
import type { Route } from "./+types/list";

export const meta: Route.MetaFunction = () => [{ title: "Guitars · Stillpeg" }];

export async function loader({ context, url }: Route.LoaderArgs) {
  const member = requireMember(context, url);
  const db = getDb();
  const [guitars, capos, note] = await Promise.all([
    listGuitars(db, member),
    listCapos(db, member),
    noteOf(url, member),
  ]);
  return { guitars, capos, note, naming: member.naming, mayEdit: can(member.role, "prepare") };
}

/** What the address says was just done, in words; null where nothing was or the act has no such thing. */
async function noteOf(url: URL, member: { actId: string }): Promise<{ text: string; undo?: string } | null> {
  const guitarId = url.searchParams.get("guitar");
  const guitar = guitarId ? await findGuitar(getDb(), member, guitarId) : null;
  if (guitar?.deleted && url.searchParams.has("taken")) {
    const text = `${guitar.name} cannot come back: another guitar has the short name ${guitar.shortName} now. Change that one first.`;
    return { text, undo: `/guitars/${guitar.id}/restore` };
  }
  if (guitar) return told(guitar, `/guitars/${guitar.id}/restore`);
  const capoId = url.searchParams.get("capo");
  const capo = capoId ? await findCapo(getDb(), member, capoId) : null;
  return capo ? told(capo, `/capos/${capo.id}/restore`) : null;
}

function told(thing: { name: string; deleted: boolean }, restore: string): { text: string; undo?: string } {
  return thing.deleted ? { text: `${thing.name} deleted.`, undo: restore } : { text: `${thing.name} saved.` };
}

export default function Guitars({ loaderData }: Route.ComponentProps) {
  const { guitars, capos, note, naming, mayEdit } = loaderData;
  return (
    <>
      {note ? <UndoBar undo={mayEdit ? note.undo : undefined}>{note.text}</UndoBar> : null}
      <PageHead title="Guitars">
        {mayEdit && guitars.length > 0 ? (
          <span className="hidden md:flex">
            <AddGuitar />
          </span>
        ) : null}
      </PageHead>
      {mayEdit && guitars.length > 0 ? (
        <BottomActions>
          <AddGuitar />
        </BottomActions>
      ) : null}
      {guitars.length > 0 ? (
        <GuitarList guitars={guitars} naming={naming} />
      ) : (
        <EmptyState title="No guitars yet">
          <p>
            {mayEdit
              ? "Add the guitars you bring, with their usual tunings and how far each string may be tuned. Other stringed instruments work the same way."
              : "When somebody adds the act's guitars, they stand here."}
          </p>
          {mayEdit ? <AddGuitar /> : null}
        </EmptyState>
      )}
      <section aria-labelledby="capos-title" className="mt-8">
        <div className="flex flex-wrap items-end justify-between gap-3 px-4 pb-3 md:px-6">
          <h2 id="capos-title" className="font-bold text-2xl">
            Capos
          </h2>
          {mayEdit ? <ButtonLink to="/capos/new">Add capo</ButtonLink> : null}
        </div>
        {capos.length > 0 ? (
          <CapoList capos={capos} mayEdit={mayEdit} />
        ) : (
          <p className="px-4 text-grey-600 md:px-6">
            No capos yet. With them listed, a gig warns when it has more capos on necks at once than you own.
          </p>
        )}
      </section>
    </>
  );
}

function AddGuitar() {
  return (
    <ButtonLink to="/guitars/new" look="primary">
      Add guitar
    </ButtonLink>
  );
}
