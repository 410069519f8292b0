import { nanoid } from "nanoid";
import { useMemo, useState } from "react";
import { usePageTools } from "#app/components/gig/desk/page-context.tsx";
import { partName } from "#app/components/gig/sets/moves.ts";
import { Answers } from "#app/components/gig/what-if/answers.tsx";
import { Choices } from "#app/components/gig/what-if/choices.tsx";
import { type QuestionProps, useAsked } from "#app/components/gig/what-if/question.ts";
import { useOutcomes } from "#app/components/gig/what-if/use-outcomes.ts";
import { setsNow, signedSeconds } from "#app/components/gig/what-if/what-if-words.ts";
import { SelectField } from "#app/components/ui/field.tsx";
import type { Gig } from "#app/domain/gig/gig.ts";
import { entriesOf, setsOf } from "#app/domain/gig/order.ts";
import type { Repertoire } from "#app/domain/gig/repertoire.ts";
import { type LatePlace, latePlaces } from "#app/domain/gig/what-if/late-song.ts";
import { needsOf } from "#app/domain/gig/what-if/needs.ts";
import { needsNow } from "#app/domain/gig/what-if/outcome.ts";
import { whyLeft } from "#app/domain/gig/why-left.ts";
import type { Song } from "#app/domain/repertoire/song.ts";

/** A song is added late: where it costs least. */
export function LateSongQuestion(props: QuestionProps) {
  const { gig, repertoire } = props;
  const standing = new Set(gig.entries.map((entry) => entry.songId));
  const songs = repertoire.songs
    .filter((song) => !song.deleted)
    .toSorted((a, b) => a.title.localeCompare(b.title));
  const [picked, setPicked] = useState("");
  const fresh = songs.filter((song) => !standing.has(song.id));
  const again = songs.filter((song) => standing.has(song.id));
  const song = songs.find(({ id }) => id === picked) ?? fresh[0] ?? again[0];
  if (!song) return <p className="text-grey-600">There are no songs in the library yet.</p>;
  return (
    <>
      <SelectField
        id="what-if-late"
        label="Song"
        value={song.id}
        onChange={(event) => setPicked(event.currentTarget.value)}
      >
        <SongGroup label="Not in this gig" songs={fresh} />
        <SongGroup label="In this gig already" songs={again} />
      </SelectField>
      <Late key={song.id} {...props} song={song} />
    </>
  );
}

function SongGroup({ label, songs }: { label: string; songs: readonly Song[] }) {
  if (songs.length === 0) return null;
  return (
    <optgroup label={label}>
      {songs.map(({ id, title }) => (
        <option key={id} value={id}>
          {title}
        </option>
      ))}
    </optgroup>
  );
}

/** Where a place is, by the song that it follows or precedes: "Set 1, after Stonecrop". */
function placeWords(gig: Gig, repertoire: Repertoire, place: LatePlace): string {
  const set = setsOf(gig).find((one) => one.id === place.setId);
  const entries = entriesOf(gig, place.setId).filter((entry) => entry.section === place.section);
  const title = (index: number) => repertoire.songs.find((song) => song.id === entries[index]?.songId)?.title;
  const part = partName({ setName: set?.name ?? "", section: place.section });
  const before = title(place.index - 1);
  const next = title(place.index);
  if (before !== undefined) return `${part}, after ${before}`;
  return next === undefined ? part : `${part}, before ${next}`;
}

/** As many places are offered. */
const offered = 5;

const keyOf = ({ setId, section, index }: LatePlace) => `${setId}/${section}/${index}`;

function Late({ song, ...props }: QuestionProps & { song: Song }) {
  const { gig, plan, repertoire } = props;
  const { naming } = usePageTools();
  const [entryId] = useState(() => nanoid(16));
  const [picked, setPicked] = useState("");
  const places = useMemo(
    () => latePlaces(gig, plan, repertoire, { song, entryId }),
    [gig, plan, repertoire, song, entryId],
  );
  const place = places.find((one) => keyOf(one) === picked) ?? places[0];
  if (!place)
    return (
      <p>
        {whyLeft(song, repertoire.guitars, song.necks, naming) ??
          "Held songs and rules leave no place for it."}
      </p>
    );
  const now = needsOf(plan.sets).exposed;
  return (
    <>
      <Choices
        legend="Best places, nothing else changed"
        chosen={keyOf(place)}
        onChoose={setPicked}
        choices={places.slice(0, offered).map((one) => ({
          key: keyOf(one),
          words: placeWords(gig, repertoire, one),
          figure: signedSeconds(now, one.needs.exposed),
        }))}
      />
      <Placed key={keyOf(place)} {...props} song={song} place={place} />
    </>
  );
}

function Placed({ song, place, ...props }: QuestionProps & { song: Song; place: LatePlace }) {
  const { repertoire } = props;
  const asked = useAsked(props, place.supposed);
  const found = useOutcomes(asked, true);
  return (
    <Answers
      found={found}
      now={needsNow(asked)}
      nowName={setsNow(asked)}
      names={{ "as-it-is": "Just add" }}
      guitars={() => repertoire.guitars}
      use={() => `Add ${song.title}`}
    />
  );
}
