import type { FormMetadata } from "@conform-to/react";
import type { ReactNode } from "react";
import { Button } from "#app/components/ui/button.tsx";
import { Warning } from "#app/components/ui/warning.tsx";

type SaveBarProps = {
  // biome-ignore lint/suspicious/noExplicitAny: any form has what this needs
  form: Pick<FormMetadata<any>, "errors" | "status">;
  saving: boolean;
  unsaved: boolean;
  label: string;
  /** What became of the last save; gives way as soon as something is changed. */
  status?: ReactNode;
};

/** The foot of a form: its one primary action, in reach of the thumb on a phone, and what keeps it from being saved. */
export function SaveBar({ form, saving, unsaved, label, status }: SaveBarProps) {
  return (
    <div className="fixed inset-x-0 bottom-0 z-10 flex flex-wrap items-center gap-x-4 gap-y-1 border-grey-200 border-t bg-ground px-4 py-3 md:sticky md:px-6">
      <Button
        type="submit"
        look="primary"
        // A button that is switched off while it saves would lose the focus.
        aria-disabled={saving}
        onClick={(event) => {
          if (saving) event.preventDefault();
        }}
        className="grow md:grow-0"
      >
        {saving ? "Saving" : label}
      </Button>
      {form.errors?.map((error: string) => (
        <Warning key={error}>{error}</Warning>
      ))}
      {form.status === "error" && !form.errors ? (
        <Warning>Not saved. See the fields marked above.</Warning>
      ) : null}
      {unsaved || form.status === "error" ? null : status}
    </div>
  );
}
