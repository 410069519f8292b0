import { stringRange } from "#app/components/capo-mark.tsx";
import { GuitarBadge } from "#app/components/guitar-badge.tsx";
import { NeckTable } from "#app/components/tuning/neck-table.tsx";
import { Octagon, Warning } from "#app/components/ui/warning.tsx";
import { capoWords, shadowedCapos, sounding } from "#app/domain/music/capo.ts";
import { spellingFifths } from "#app/domain/music/key.ts";
import type { Capo } from "#app/domain/music/neck.ts";
import type { Naming } from "#app/domain/music/note-names.ts";
import { raisedStrings } from "#app/domain/music/range.ts";
import type { TunedString } from "#app/domain/music/tuning.ts";
import type { FormGuitar } from "#app/domain/repertoire/form-guitar.ts";
import { playableOn } from "#app/domain/repertoire/playable-on.ts";

type WayReadingProps = {
  strings: readonly TunedString[];
  capos: readonly Capo[];
  only: string[] | null;
  guitars: readonly FormGuitar[];
  naming: Naming;
  /** The song's key, "" where unknown: what sounds is spelled in it. */
  songKey: string;
  caption: string;
};

/** What one way to play a song comes to: the neck string by string, its warnings, and the guitars it can be had on. */
export function WayReading({ strings, capos, only, guitars, naming, songKey, caption }: WayReadingProps) {
  const way = {
    open: strings.map(({ midi }) => midi),
    capos: [...capos],
    guitars: only,
  };
  const useless = shadowedCapos(capos).filter((shadowed) => shadowed.useless);
  return (
    <div className="flex flex-col gap-4">
      <div className="overflow-x-auto">
        <NeckTable
          strings={strings}
          capos={capos}
          naming={naming}
          fifths={spellingFifths(songKey, sounding(way))}
          caption={caption}
        />
      </div>
      {useless.map(({ capo }) => (
        <Warning key={capoWords(capo, strings.length)}>
          {`${capoWords(capo, strings.length)} does nothing: another capo stops all its strings further up.`}
        </Warning>
      ))}
      <PlayedOn way={way} guitars={guitars} naming={naming} />
    </div>
  );
}

type PlayedOnProps = {
  way: { open: number[]; capos: Capo[]; guitars: string[] | null };
  guitars: readonly FormGuitar[];
  naming: Naming;
};

function PlayedOn({ way, guitars, naming }: PlayedOnProps) {
  const live = guitars.filter((guitar) => !guitar.deleted);
  if (live.length === 0) {
    return (
      <p className="text-grey-600 text-sm">
        The act has no guitars yet, so nothing says whether this can be played.
      </p>
    );
  }
  const { can, cannot } = playableOn(way, live, naming);
  const told = cannot.filter(({ guitar }) =>
    way.guitars === null
      ? can.length === 0 || guitar.strings === way.open.length
      : way.guitars.includes(guitar.id),
  );
  const raised = raisedOn(way.open, can);
  return (
    <div className="flex flex-col gap-2 text-sm">
      {can.length > 0 ? (
        <p className="flex flex-wrap items-center gap-2">
          <span className="font-display font-medium text-grey-600">Can be played on</span>
          {can.map((guitar) => (
            <GuitarBadge
              key={guitar.id}
              shortName={guitar.shortName}
              shape={guitar.badge}
              title={guitar.name}
            />
          ))}
        </p>
      ) : (
        <Warning>No guitar of the act can play it this way.</Warning>
      )}
      {told.length > 0 ? (
        <ul className="flex flex-col gap-1 text-grey-600">
          {told.map(({ guitar, reason }) => (
            <li key={guitar.id}>{`Not on ${guitar.name}: ${reason}.`}</li>
          ))}
        </ul>
      ) : null}
      {raised.length > 0 ? (
        <div className="flex items-start gap-1.5">
          <span className="mt-1">
            <Octagon />
          </span>
          <div>
            {raised.map((sentence) => (
              <p key={sentence}>{sentence}</p>
            ))}
            <p className="text-grey-600">
              Wear eye protection while a string is raised. A qualified repairer decides what the instrument
              bears.
            </p>
          </div>
        </div>
      ) : null}
    </div>
  );
}

/** Which strings stand above their usual pitch on which guitars, one sentence for all guitars that are alike in it. */
function raisedOn(open: readonly number[], guitars: readonly FormGuitar[]): string[] {
  const names = new Map<string, string[]>();
  for (const guitar of guitars) {
    const raised = raisedStrings(open, guitar.usual);
    if (raised.length === 0) continue;
    const sizes = [...new Set(raised.map(({ semitones }) => semitones))];
    const words = sizes.map((size) => {
      const strings = raised.filter(({ semitones }) => semitones === size).map(({ string }) => string);
      return `${strings.length === 1 ? "string" : "strings"} ${stringRange(strings)} up ${size}`;
    });
    names.set(words.join(", "), [...(names.get(words.join(", ")) ?? []), guitar.name]);
  }
  return [...names].map(
    ([strings, on]) => `On ${on.join(", ")}: ${strings} from usual. A raised string may break.`,
  );
}
