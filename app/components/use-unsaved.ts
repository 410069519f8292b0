import { type FormEvent, useState } from "react";

/** Watches a form for anything typed, ticked, moved or removed since the form with this id began. */
export function useUnsaved(id: string): {
  unsaved: boolean;
  watch: { onInput: () => void; onSubmitCapture: (event: FormEvent<HTMLFormElement>) => void };
} {
  const [changed, setChanged] = useState<string | null>(null);
  return {
    unsaved: changed === id,
    watch: {
      onInput: () => setChanged(id),
      onSubmitCapture: (event) => {
        const { submitter } = event.nativeEvent as SubmitEvent;
        if (submitter instanceof HTMLButtonElement && changesForm(submitter)) setChanged(id);
      },
    },
  };
}

/** Conform's own buttons change the form's lists and values; all but the one that only asks it to validate. */
function changesForm(submitter: HTMLButtonElement): boolean {
  return submitter.name === "__intent__" && !submitter.value.startsWith('{"type":"validate"');
}
