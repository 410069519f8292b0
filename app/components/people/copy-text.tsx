import { useEffect, useRef, useState } from "react";
import { Button } from "#app/components/ui/button.tsx";

/** A line of text that can be copied with one press, or by hand where the browser does not allow that. */
export function CopyText({ label, text }: { label: string; text: string }) {
  const field = useRef<HTMLInputElement>(null);
  const [scripted, setScripted] = useState(false);
  const [said, setSaid] = useState("");
  useEffect(() => setScripted(true), []);

  async function copy() {
    field.current?.select();
    try {
      await navigator.clipboard.writeText(text);
      setSaid("Copied");
    } catch {
      setSaid(
        "This browser does not let pages copy. The link is marked: copy it with the keyboard or a long press.",
      );
    }
  }

  return (
    <div className="flex flex-col gap-1">
      <div className="flex gap-2">
        <input
          ref={field}
          readOnly
          value={text}
          aria-label={label}
          onFocus={(event) => event.target.select()}
          className="min-h-11 min-w-0 flex-1 rounded-sm border border-grey-400 bg-white px-3"
        />
        {scripted ? (
          <Button look="primary" onClick={copy}>
            Copy
          </Button>
        ) : null}
      </div>
      <p role="status" className="min-h-6 text-grey-600 text-sm">
        {said}
      </p>
    </div>
  );
}
