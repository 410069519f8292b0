import type { FieldMetadata } from "@conform-to/react";
import { ChevronRight } from "lucide-react";
import { useEffect, useRef, useState } from "react";
import { Button } from "#app/components/ui/button.tsx";
import { describedBy, fieldIds } from "#app/components/ui/field.tsx";
import { Warning } from "#app/components/ui/warning.tsx";
import { type Crew, defaultTimes, type GigTimes } from "#app/domain/gig/gig.ts";
import { type GigFormInput, timeKeys, timeNames } from "#app/domain/gig/gig-form.ts";

type GigTimesFieldsProps = {
  times: FieldMetadata<GigFormInput["times"]>;
  crew: Crew;
};

const groups: { title: string; keys: readonly (keyof GigTimes)[] }[] = [
  { title: "Work", keys: timeKeys.filter((key) => !/cover/i.test(key)) },
  { title: "Talk and applause", keys: timeKeys.filter((key) => /cover/i.test(key)) },
];

/** The seconds that work takes and talk covers; folded away, since the usual ones do for most gigs. */
export function GigTimesFields({ times, crew }: GigTimesFieldsProps) {
  const fields = times.getFieldset();
  const own = timeKeys.filter((key) => (fields[key].value ?? "") !== "").length;
  const wrong = timeKeys.some((key) => fields[key].errors?.length);
  const details = useRef<HTMLDetailsElement>(null);
  const [wrongAtFirst] = useState(wrong);
  const [live, setLive] = useState(false);
  useEffect(() => setLive(true), []);
  useEffect(() => {
    if (wrong && details.current) details.current.open = true;
  }, [wrong]);
  const words = own === 0 ? "usual" : own === 1 ? "1 of your own" : `${own} of your own`;
  return (
    <details className="group border-grey-200 border-y" ref={details} open={wrongAtFirst || undefined}>
      <summary className="flex min-h-11 flex-wrap items-center gap-x-2 font-display font-semibold">
        <ChevronRight size={16} aria-hidden="true" className="shrink-0 group-open:rotate-90" />
        Times
        <span className="font-normal font-sans text-grey-600 text-sm">{words}</span>
      </summary>
      <div className="flex flex-col gap-4 pb-4">
        <p className="text-grey-600 text-sm">
          Seconds. Where a field is empty the usual time counts, shown in grey.
        </p>
        {groups.map(({ title, keys }) => (
          <fieldset key={title} className="grid gap-x-6 gap-y-2 sm:grid-cols-2">
            <legend className="pb-1 font-semibold text-base">{title}</legend>
            {keys.map((key) => (
              <Seconds
                key={`${key} ${fields[key].key}`}
                label={timeNames[key]}
                usual={defaultTimes[crew][key]}
                field={fields[key]}
              />
            ))}
          </fieldset>
        ))}
        {live ? (
          <Button small className="self-start" disabled={own === 0} onClick={() => empty(details.current)}>
            Reset to usual times
          </Button>
        ) : null}
      </div>
    </details>
  );
}

/** Empties every field in here as if a person had. */
function empty(fields: HTMLElement | null): void {
  for (const input of fields?.querySelectorAll("input") ?? []) {
    input.value = "";
    input.dispatchEvent(new Event("input", { bubbles: true }));
  }
}

type SecondsProps = { label: string; usual: number; field: FieldMetadata<string | undefined> };

function Seconds({ label, usual, field }: SecondsProps) {
  const ids = fieldIds(field.id);
  return (
    <div>
      <div className="flex items-center justify-between gap-3">
        <label htmlFor={field.id} className="font-medium">
          {label}
        </label>
        <input
          id={field.id}
          name={field.name}
          defaultValue={field.initialValue}
          placeholder={String(usual)}
          inputMode="numeric"
          className="tabular min-h-11 w-20 rounded-sm border border-grey-400 bg-white px-3 text-right text-base placeholder:text-grey-600 aria-[invalid=true]:border-2 aria-[invalid=true]:border-warning"
          aria-invalid={field.errors?.length ? true : undefined}
          aria-describedby={describedBy(ids, null, field.errors)}
        />
      </div>
      {field.errors?.length ? (
        <div id={ids.errorId}>
          {field.errors.map((error) => (
            <Warning key={error}>{error}</Warning>
          ))}
        </div>
      ) : null}
    </div>
  );
}
