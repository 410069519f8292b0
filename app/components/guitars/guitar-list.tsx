import { Link } from "react-router";
import { GuitarBadge } from "#app/components/guitar-badge.tsx";
import { dayWords, kindWords } from "#app/components/guitars/kind-words.ts";
import { TuningCells } from "#app/components/tuning-cells.tsx";
import { formatTuning, spokenTuning } from "#app/domain/music/format-tuning.ts";
import type { Naming } from "#app/domain/music/note-names.ts";
import type { Guitar } from "#app/domain/repertoire/guitar.ts";
import { reachOf, reachWords } from "#app/domain/repertoire/reach.ts";

/** Shared with the capos below, so that both stand in the same columns. */
export const guitarColumns =
  "grid items-center gap-x-4 grid-cols-[5rem_minmax(0,1fr)] lg:grid-cols-[4.5rem_minmax(0,1fr)_12.5rem_8.5rem_8rem_6rem_6.5rem] xl:grid-cols-[4.5rem_minmax(12rem,18rem)_12.5rem_8.5rem_9rem_6rem_6.5rem_minmax(0,1fr)]";

const heads = [
  "Badge",
  "Guitar",
  "Usual tuning",
  "From usual",
  "In the show",
  "Channel",
  "Strings from",
  "Notes",
];

/** The act's guitars, one row each. */
export function GuitarList({ guitars, naming }: { guitars: readonly Guitar[]; naming: Naming }) {
  return (
    <div>
      <div
        aria-hidden="true"
        className={`${guitarColumns} min-h-9 border-grey-200 border-b px-4 font-display font-medium text-grey-600 text-sm max-lg:hidden md:px-6`}
      >
        {heads.map((head) => (
          <span key={head} className="last:hidden xl:last:inline">
            {head}
          </span>
        ))}
      </div>
      <ul>
        {guitars.map((guitar) => (
          <Row
            key={guitar.id}
            guitar={guitar}
            naming={naming}
            spareFor={guitars.find((other) => other.id === guitar.spareFor)?.name ?? null}
          />
        ))}
      </ul>
    </div>
  );
}

function Row({ guitar, naming, spareFor }: { guitar: Guitar; naming: Naming; spareFor: string | null }) {
  const inShow = [
    guitar.keeps ? "keeps its tuning" : "",
    guitar.leftHanded ? "left-handed" : "",
    spareFor ? `spare for ${spareFor}` : "",
  ].filter(Boolean);
  return (
    <li className="border-grey-200 border-b bg-white hover:bg-ground">
      <div className={`${guitarColumns} relative min-h-13 gap-y-1 px-4 py-2 md:px-6`}>
        <GuitarBadge shortName={guitar.shortName} shape={guitar.badge} />
        <p className="min-w-0 truncate">
          <Link
            to={`/guitars/${guitar.id}`}
            className="font-display font-semibold text-lg underline-offset-4 after:absolute after:inset-0 hover:underline"
          >
            {guitar.name}
          </Link>
          <span className="ml-3 text-grey-600 text-sm">{kindWords[guitar.kind]}</span>
        </p>
        <span className="-ml-2 max-lg:col-start-2">
          <TuningCells
            letters={formatTuning(guitar.usual, naming)}
            spoken={spokenTuning(guitar.usual, naming)}
          />
        </span>
        <div className="flex flex-wrap gap-x-4 text-sm max-lg:col-start-2 lg:contents">
          <p>
            <span className="sr-only">Semitones from usual: </span>
            {reachWords(reachOf(guitar))}
          </p>
          <p className="first-letter:uppercase max-lg:empty:hidden">{inShow.join(", ")}</p>
          <p className="max-lg:empty:hidden">{guitar.channel}</p>
          <p className="max-lg:empty:hidden">
            {guitar.strungOn ? (
              <>
                <span className="lg:sr-only">Strings fitted on </span>
                {dayWords(guitar.strungOn)}
              </>
            ) : null}
          </p>
          <p className="truncate text-grey-600 max-xl:hidden">{guitar.notes}</p>
        </div>
      </div>
    </li>
  );
}
