import { useState } from "react";
import { type EntryTopic, usePageTools } from "#app/components/gig/desk/page-context.tsx";
import { RulesForm } from "#app/components/gig/dialogs/rules-form.tsx";
import type { Part } from "#app/components/gig/sets/moves.ts";
import { Button } from "#app/components/ui/button.tsx";
import { Dialog } from "#app/components/ui/dialog.tsx";
import { TextArea, TextField } from "#app/components/ui/field.tsx";
import type { Entry, Gig } from "#app/domain/gig/gig.ts";

const formId = "entry-form";

type EntryDialogProps = {
  entry: Entry;
  topic: EntryTopic;
  gig: Gig;
  parts: Part[];
  titleOf: (entryId: string) => string;
  /** Seconds of talk that count where this entry says nothing of its own. */
  usualCover: number;
  onClose: () => void;
};

const topics: Record<EntryTopic, (title: string) => string> = {
  rules: (title) => `Rules for ${title}`,
  cover: (title) => `Talk before ${title}`,
  note: (title) => `Note for the tech: ${title}`,
};

/** Rules, talk or tech note of one song in this set. */
export function EntryDialog({ entry, topic, gig, parts, titleOf, usualCover, onClose }: EntryDialogProps) {
  const title = titleOf(entry.id);
  return (
    <Dialog
      open
      onOpenChange={(open) => (open ? null : onClose())}
      title={topics[topic](title)}
      closeLabel={topic === "rules" ? "Done" : "Cancel"}
      actions={
        topic === "rules" ? undefined : (
          <Button type="submit" form={formId} look="primary">
            Keep it
          </Button>
        )
      }
    >
      {topic === "rules" ? <RulesForm entry={entry} gig={gig} parts={parts} titleOf={titleOf} /> : null}
      {topic === "cover" ? (
        <CoverForm entry={entry} title={title} usual={usualCover} onDone={onClose} />
      ) : null}
      {topic === "note" ? <NoteForm entry={entry} title={title} onDone={onClose} /> : null}
    </Dialog>
  );
}

/** The longest talk an entry may have, half an hour. */
const longestCover = 1800;

function readCover(text: string): number | null | "unread" {
  if (text.trim() === "") return null;
  const seconds = Number(text.trim());
  return Number.isFinite(seconds) && seconds >= 0 && seconds <= longestCover ? Math.round(seconds) : "unread";
}

function CoverForm({
  entry,
  title,
  usual,
  onDone,
}: {
  entry: Entry;
  title: string;
  usual: number;
  onDone: () => void;
}) {
  const { edit } = usePageTools();
  const [text, setText] = useState(entry.cover === null ? "" : String(entry.cover));
  const [error, setError] = useState<string>();
  return (
    <form
      id={formId}
      className="flex flex-col items-start gap-4"
      onSubmit={(event) => {
        event.preventDefault();
        const cover = readCover(text);
        if (cover === "unread") {
          setError(`Write seconds from 0 to ${longestCover}, or leave it empty for ${usual} s.`);
          return;
        }
        if (cover !== entry.cover) {
          edit(
            [{ kind: "entry.set", entryId: entry.id, field: "cover", value: cover }],
            `Talk before ${title}`,
          );
        }
        onDone();
      }}
    >
      <TextField
        id="entry-cover"
        label="Seconds of talk"
        inputMode="numeric"
        value={text}
        onChange={(event) => setText(event.currentTarget.value)}
        hint={`Work within the talk is no dead air. Empty: ${usual} s, as for the song or the gig.`}
        errors={error ? [error] : undefined}
      />
    </form>
  );
}

/** As long as the field of a tech note may be. */
const longestNote = 500;

function NoteForm({ entry, title, onDone }: { entry: Entry; title: string; onDone: () => void }) {
  const { edit } = usePageTools();
  const [text, setText] = useState(entry.techNote);
  return (
    <form
      id={formId}
      className="flex flex-col items-start gap-4"
      onSubmit={(event) => {
        event.preventDefault();
        const note = text.trim();
        if (note !== entry.techNote) {
          edit(
            [{ kind: "entry.set", entryId: entry.id, field: "techNote", value: note }],
            `Note for the tech: ${title}`,
          );
        }
        onDone();
      }}
    >
      <TextArea
        id="entry-note"
        label="What the tech should know"
        wrapClass="w-full"
        rows={3}
        maxLength={longestNote}
        value={text}
        onChange={(event) => setText(event.currentTarget.value)}
        hint={`For this song in this set. ${longestNote} characters at most.`}
      />
    </form>
  );
}
