import { useDeferredValue, useEffect, useMemo, useRef, useState } from "react";
import { useFetcher } from "react-router";
import { PastePreview } from "#app/components/songs/paste-preview.tsx";
import { instrumentLabel } from "#app/components/songs/way-words.ts";
import { Button } from "#app/components/ui/button.tsx";
import { SelectField, TextArea, TextField } from "#app/components/ui/field.tsx";
import { Warning } from "#app/components/ui/warning.tsx";
import type { Naming } from "#app/domain/music/note-names.ts";
import { assumedSeconds, pasteLimits, readPastedList } from "#app/domain/repertoire/pasted-list.ts";
import { formatDuration, readDuration } from "#app/domain/repertoire/read-duration.ts";
import { readUsualCode, type UsualChoice, usualCode } from "#app/domain/repertoire/usual-choices.ts";

/** What `POST /songs/paste` answers while something is left to do. */
export type PasteAnswer = {
  /** What the box holds now. */
  text: string;
  usual: string;
  length: string;
  errors: { text?: string[]; length?: string[] };
  /** Songs that are kept, in the order of their lines; those that the library had already are among them. */
  kept: { id: string; title: string }[];
  /** How many of these are new. */
  added: number;
};

type PasteSongsProps = {
  naming: Naming;
  choices: readonly UsualChoice[];
  /** The titles that the library has. */
  library: readonly { id: string; title: string }[];
  /** What the server answered to the last paste, where scripts do not run. */
  answer?: PasteAnswer;
  /** Where songs go into a set: told which songs were kept. Without it the library page opens when all is kept. */
  onKept?: (songs: PasteAnswer["kept"]) => void;
};

/** A box to paste a list into, one song a line, and what was understood of it, line by line, before it is kept. */
export function PasteSongs({ naming, choices, library, answer: posted, onKept }: PasteSongsProps) {
  const fetcher = useFetcher<PasteAnswer>();
  const answer = fetcher.data ?? posted;
  const [text, setText] = useState(answer?.text ?? "");
  const [usual, setUsual] = useState(answer?.usual ?? usualCode(choices[0]!.usual));
  const [length, setLength] = useState(answer?.length ?? formatDuration(assumedSeconds));
  const reuse = onKept !== undefined;
  const box = useRef<HTMLTextAreaElement>(null);
  // What was typed or pasted before the page came alive counts too.
  useEffect(() => {
    if (box.current?.value) setText(box.current.value);
  }, []);
  const told = useRef<PasteAnswer | null>(null);
  useEffect(() => {
    if (!fetcher.data || told.current === fetcher.data) return;
    told.current = fetcher.data;
    setText(fetcher.data.text);
    if (fetcher.data.kept.length > 0) onKept?.(fetcher.data.kept);
  }, [fetcher.data, onKept]);

  const pasted = useDeferredValue(text);
  const lines = useMemo(
    () =>
      readPastedList(pasted, {
        usual: readUsualCode(usual) ?? [...choices[0]!.usual],
        naming,
      }),
    [pasted, usual, naming, choices],
  );
  const reading = readDuration(length);
  const seconds = reading.ok ? reading.seconds : assumedSeconds;
  const songs = lines.filter((line) => line.song !== null).length;
  const missing = lines.some((line) => line.song?.seconds === null);
  const busy = fetcher.state !== "idle";
  return (
    <fetcher.Form
      method="post"
      action="/songs/paste"
      className="grid gap-x-8 gap-y-6 lg:grid-cols-[minmax(0,2fr)_minmax(0,3fr)]"
    >
      {reuse ? <input type="hidden" name="reuse" value="yes" /> : null}
      <div className="flex flex-col gap-4">
        <TextArea
          id="paste-text"
          ref={box}
          name="text"
          label="Your list"
          hint="One song a line: title, then tuning, capo, key and length in any order. Energy 4 or wanted 5, each of 5, may stand there too."
          errors={answer?.errors.text}
          rows={14}
          maxLength={pasteLimits.characters}
          spellCheck={false}
          placeholder={"Low Meadow DADGBE capo 2 3:15\nQuarry Song CGCFFC capo 3 leave 6 3:55"}
          value={text}
          onChange={(event) => setText(event.target.value)}
        />
        {choices.length > 1 ? (
          <SelectField
            id="paste-usual"
            name="usual"
            label="Written for"
            value={usual}
            onChange={(event) => setUsual(event.target.value)}
          >
            {choices.map((choice) => (
              <option key={usualCode(choice.usual)} value={usualCode(choice.usual)}>
                {instrumentLabel(choice, naming)}
              </option>
            ))}
          </SelectField>
        ) : (
          <input type="hidden" name="usual" value={usual} />
        )}
        <TextField
          id="paste-length"
          name="length"
          label="Length where a line names none"
          errors={answer?.errors.length ?? (reading.ok ? undefined : [reading.message])}
          value={length}
          onChange={(event) => setLength(event.target.value)}
          className="max-w-28 tabular"
        />
        <noscript>
          <Button type="submit" name="step" value="read">
            Read the list
          </Button>
        </noscript>
      </div>
      <section aria-label="What was understood" className="flex flex-col gap-3">
        <Told answer={answer} unread={lines.length - songs} />
        {lines.length > 0 ? (
          <>
            <PastePreview lines={lines} naming={naming} seconds={seconds} library={library} reuse={reuse} />
            <div className="flex flex-wrap items-center gap-x-4 gap-y-2">
              <Button type="submit" look="primary" name="step" value="keep" disabled={busy || songs === 0}>
                {busy ? "Keeping" : reuse ? "Add the ticked songs to the set" : "Keep the ticked songs"}
              </Button>
              <p className="text-grey-600">{counted(songs, lines.length - songs)}</p>
            </div>
            {missing ? (
              <p className="text-grey-600 text-sm">{`Lengths in italics are assumed. The clock of a gig counts them, so correct them in the song.`}</p>
            ) : null}
          </>
        ) : (
          <p className="text-grey-600">
            What is understood shows here, line by line, before anything is kept.
          </p>
        )}
      </section>
    </fetcher.Form>
  );
}

function Told({ answer, unread }: { answer: PasteAnswer | undefined; unread: number }) {
  if (!answer || answer.kept.length === 0) return null;
  const kept = answer.kept.length === 1 ? "1 song kept." : `${answer.kept.length} songs kept.`;
  return (
    <div role="status" className="flex flex-col gap-1">
      <p>{answer.text === "" ? kept : `${kept} The lines that were not are still in the box.`}</p>
      {unread > 0 ? (
        <Warning>{unread === 1 ? "1 line cannot be read." : `${unread} lines cannot be read.`}</Warning>
      ) : null}
    </div>
  );
}

function counted(songs: number, unread: number): string {
  const read = songs === 1 ? "1 line understood" : `${songs} lines understood`;
  if (unread === 0) return `${read}.`;
  return `${read}, ${unread} not: ${unread === 1 ? "it stays" : "they stay"} in the box.`;
}
