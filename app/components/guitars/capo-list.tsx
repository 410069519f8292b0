import { Link } from "react-router";
import { CapoPicture } from "#app/components/guitars/capo-picture.tsx";
import { coverWords } from "#app/components/guitars/capo-words.ts";
import { guitarColumns } from "#app/components/guitars/guitar-list.tsx";
import { PostButton } from "#app/components/post-button.tsx";
import type { ActCapo } from "#app/domain/repertoire/guitar.ts";

/** The kinds of capo an act owns, one row each. */
export function CapoList({ capos, mayEdit }: { capos: readonly ActCapo[]; mayEdit: boolean }) {
  return (
    <ul className="border-grey-200 border-t">
      {capos.map((capo) => (
        <li key={capo.id} className="border-grey-200 border-b bg-white hover:bg-ground">
          <div className={`${guitarColumns} relative min-h-13 px-4 py-2 md:px-6`}>
            <CapoPicture strings={capo.strings} count={Math.max(6, ...(capo.strings ?? []))} />
            <p className="truncate">
              {mayEdit ? (
                <Link
                  to={`/capos/${capo.id}`}
                  className="font-display font-semibold text-lg underline-offset-4 after:absolute after:inset-0 hover:underline"
                >
                  {capo.name}
                </Link>
              ) : (
                <span className="font-display font-semibold text-lg">{capo.name}</span>
              )}
            </p>
            <div className="flex flex-wrap gap-x-4 text-sm max-lg:col-start-2 lg:contents">
              <p>{coverWords(capo.strings)}</p>
              <p>{capo.count === 1 ? "One of them" : `${capo.count} of them`}</p>
            </div>
            {mayEdit ? (
              <div className="relative z-10 col-end-[-1] justify-self-end max-lg:hidden">
                <PostButton
                  small
                  look="quiet"
                  action={`/capos/${capo.id}/delete`}
                  aria-label={`Delete ${capo.name}`}
                >
                  Delete
                </PostButton>
              </div>
            ) : null}
          </div>
        </li>
      ))}
    </ul>
  );
}
