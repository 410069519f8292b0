import type { ReactNode } from "react";
import { GuitarBadge } from "#app/components/guitar-badge.tsx";
import { WayReading } from "#app/components/songs/way-reading.tsx";
import { choiceName } from "#app/components/songs/way-words.ts";
import { caposWords } from "#app/domain/music/capo.ts";
import { nameKey, spellingFifths } from "#app/domain/music/key.ts";
import { type Naming, spellString } from "#app/domain/music/note-names.ts";
import { nameTuning } from "#app/domain/music/tuning-names.ts";
import type { FormGuitar } from "#app/domain/repertoire/form-guitar.ts";
import { formatDuration } from "#app/domain/repertoire/read-duration.ts";
import type { Song, SongNeck } from "#app/domain/repertoire/song.ts";
import { energyWords, priorityNames } from "#app/domain/repertoire/song-words.ts";
import { usualChoices, usualFor } from "#app/domain/repertoire/usual-choices.ts";

type SongViewProps = {
  song: Song;
  guitars: readonly FormGuitar[];
  naming: Naming;
};

/** A song to be read, for those who do not write the repertoire. */
export function SongView({ song, guitars, naming }: SongViewProps) {
  return (
    <div className="grid gap-x-10 gap-y-8 px-4 py-5 md:px-6 lg:grid-cols-[20rem_minmax(0,1fr)]">
      <dl className="flex flex-col gap-3 self-start">
        <Fact label="Length">{formatDuration(song.seconds)}</Fact>
        {song.key ? <Fact label="Key">{nameKey(song.key, naming)}</Fact> : null}
        {song.tempo === null ? null : <Fact label="Tempo">{`${song.tempo} beats a minute`}</Fact>}
        {song.energy === null ? null : <Fact label="Energy">{energyWords(song.energy)}</Fact>}
        <Fact label="In a set">{priorityNames[song.priority]}</Fact>
        {song.cover === null ? null : <Fact label="Talk before it">{`${song.cover} s`}</Fact>}
        {song.firstLine ? <Fact label="First line">{song.firstLine}</Fact> : null}
        {song.notes ? <Fact label="Notes">{song.notes}</Fact> : null}
      </dl>
      <div className="flex flex-col gap-6 lg:border-grey-200 lg:border-l lg:pl-10">
        {song.necks.map((neck, index) => (
          <Way key={neck.id} neck={neck} index={index} song={song} guitars={guitars} naming={naming} />
        ))}
      </div>
    </div>
  );
}

function Fact({ label, children }: { label: string; children: ReactNode }) {
  return (
    <div className="grid grid-cols-[7rem_minmax(0,1fr)] gap-3">
      <dt className="font-display font-medium text-grey-600">{label}</dt>
      <dd className="whitespace-pre-line">{children}</dd>
    </div>
  );
}

type WayProps = { neck: SongNeck; index: number } & SongViewProps;

function Way({ neck, index, song, guitars, naming }: WayProps) {
  const usual = usualFor(neck.open, usualChoices(guitars.filter((guitar) => !guitar.deleted)), neck.guitars);
  const fifths = spellingFifths(song.key, neck.open);
  const strings = neck.open.map((midi, place) => ({
    string: neck.open.length - place,
    midi,
    note: spellString(midi, fifths),
    semitones: midi - usual[place]!,
    alternatives: [],
  }));
  const only = guitars.filter((guitar) => neck.guitars?.includes(guitar.id));
  const words = [
    nameTuning(neck.open, usual, naming),
    neck.capos.length > 0 ? caposWords(neck.capos, neck.open.length) : null,
    neck.penalty > 0 ? `counts as ${neck.penalty} s` : null,
  ].filter((part) => part !== null);
  return (
    <section className="flex flex-col gap-3 border-grey-200 border-b pb-6">
      <h2 className="font-semibold text-xl">
        {choiceName(index)}
        <span className="ml-3 font-normal font-sans text-base text-grey-600">{words.join(", ")}</span>
      </h2>
      <WayReading
        strings={strings}
        capos={neck.capos}
        only={neck.guitars}
        guitars={guitars}
        naming={naming}
        songKey={song.key}
        caption={`${choiceName(index)}, string by string`}
      />
      {only.length > 0 ? (
        <p className="flex flex-wrap items-center gap-2 text-sm">
          <span className="font-display font-medium text-grey-600">Only on</span>
          {only.map((guitar) => (
            <GuitarBadge
              key={guitar.id}
              shortName={guitar.shortName}
              shape={guitar.badge}
              title={guitar.name}
            />
          ))}
        </p>
      ) : null}
    </section>
  );
}
