import type { FieldMetadata } from "@conform-to/react";
import type { ComponentProps, ReactNode } from "react";
import { GigTimesFields } from "#app/components/gig/details/gig-times-fields.tsx";
import { zonesByRegion } from "#app/components/gig/details/zones.ts";
import { SelectField, TextArea, TextField } from "#app/components/ui/field.tsx";
import { Warning } from "#app/components/ui/warning.tsx";
import { gigFieldLimits } from "#app/domain/gig/edit-schema.ts";
import type { GigFormInput } from "#app/domain/gig/gig-form.ts";

export type GigFormFields = {
  [Field in keyof Required<GigFormInput>]: FieldMetadata<GigFormInput[Field]>;
};

type GigFieldsProps = {
  fields: GigFormFields;
  zones: readonly string[];
  /** More fields, after the slot and the curfew. */
  children?: ReactNode;
};

/** A gig's details: what and where, when, for how long, with whom, and the times of work and talk. */
export function GigFields({ fields, zones, children }: GigFieldsProps) {
  return (
    <>
      <Line field={fields.name} label="Name" required maxLength={gigFieldLimits.name} />
      <Line field={fields.venue} label="Venue" maxLength={gigFieldLimits.venue} />
      <div className="grid grid-cols-2 gap-4 sm:grid-cols-[minmax(0,10fr)_minmax(0,9fr)_minmax(0,12fr)]">
        <Line field={fields.date} label="Date" type="date" required />
        <Line field={fields.time} label="Starts at" type="time" required />
        <ZoneField field={fields.zone} zones={zones} />
      </div>
      <div className="grid grid-cols-2 gap-4">
        <Line field={fields.slot} label="Slot, minutes" hint="Empty: no slot." inputMode="numeric" />
        <Line field={fields.curfew} label="Curfew" hint="Empty: none." type="time" />
      </div>
      {children}
      <CrewField field={fields.crew} />
      <GigTimesFields times={fields.times} crew={fields.crew.value === "tech" ? "tech" : "alone"} />
      <TextArea
        key={fields.notes.key}
        id={fields.notes.id}
        name={fields.notes.name}
        defaultValue={fields.notes.initialValue}
        errors={fields.notes.errors}
        label="Notes"
        rows={2}
        maxLength={gigFieldLimits.notes}
      />
    </>
  );
}

type LineProps = { field: FieldMetadata<string> | FieldMetadata<string | undefined> } & Omit<
  ComponentProps<typeof TextField>,
  "id" | "name" | "defaultValue" | "errors"
>;

/** A one-line text field of a form. */
export function Line({ field, ...rest }: LineProps) {
  return (
    <TextField
      key={field.key}
      id={field.id}
      name={field.name}
      defaultValue={field.initialValue as string | undefined}
      errors={field.errors}
      {...rest}
    />
  );
}

/** The time zones by continent; the gig's own is always among them. */
function ZoneField({ field, zones }: { field: GigFormFields["zone"]; zones: readonly string[] }) {
  const chosen = field.initialValue;
  const all = chosen && !zones.includes(chosen) ? [chosen, ...zones] : zones;
  return (
    <SelectField
      key={field.key}
      id={field.id}
      name={field.name}
      defaultValue={chosen}
      errors={field.errors}
      label="Time zone"
      wrapClass="max-sm:col-span-2"
    >
      {zonesByRegion(all).map(([region, names]) => (
        <optgroup key={region} label={region}>
          {names.map((zone) => (
            <option key={zone} value={zone}>
              {zone.replaceAll("_", " ")}
            </option>
          ))}
        </optgroup>
      ))}
    </SelectField>
  );
}

const crews = [
  { value: "alone", label: "No tech", hint: "The performer changes and tunes guitars on stage." },
  { value: "tech", label: "With a tech", hint: "Somebody side-stage tunes the next guitar during songs." },
] as const;

function CrewField({ field }: { field: GigFormFields["crew"] }) {
  return (
    <fieldset className="flex flex-col gap-1">
      <legend className="pb-1 font-semibold text-base">Who changes guitars</legend>
      <div className="grid gap-x-4 gap-y-2 sm:grid-cols-2">
        {crews.map(({ value, label, hint }) => (
          <label
            key={`${field.key}-${value}`}
            className="flex min-h-11 gap-3 rounded-sm border border-grey-400 bg-white px-3 py-2 has-checked:border-ink has-checked:shadow-[inset_0_0_0_1px_var(--color-ink)]"
          >
            <input
              type="radio"
              name={field.name}
              value={value}
              defaultChecked={(field.initialValue ?? "alone") === value}
              className="mt-0.5 size-5 shrink-0 accent-ink"
            />
            <span>
              <span className="block font-semibold">{label}</span>
              <span className="block font-sans text-grey-600 text-sm">{hint}</span>
            </span>
          </label>
        ))}
      </div>
      {field.errors?.map((error) => (
        <Warning key={error}>{error}</Warning>
      ))}
    </fieldset>
  );
}
