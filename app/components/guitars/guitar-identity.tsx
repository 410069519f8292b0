import { type FormMetadata, getInputProps, getSelectProps } from "@conform-to/react";
import { BadgePicker } from "#app/components/guitars/badge-picker.tsx";
import type { GuitarFieldset } from "#app/components/guitars/guitar-fields.ts";
import { kindWords } from "#app/components/guitars/kind-words.ts";
import { SelectField, TextField } from "#app/components/ui/field.tsx";
import { usualStringsFor } from "#app/domain/music/usual-tuning.ts";
import { type InstrumentKind, instrumentKinds } from "#app/domain/repertoire/guitar.ts";
import { type GuitarFormInput, guitarLimits } from "#app/domain/repertoire/guitar-form.ts";

type GuitarIdentityProps = { form: FormMetadata<GuitarFormInput>; fields: GuitarFieldset };

/** What a guitar is called and what it is. Another kind brings its own number of strings along. */
export function GuitarIdentity({ form, fields }: GuitarIdentityProps) {
  const { key: nameKey, ...name } = getInputProps(fields.name, { type: "text", ariaAttributes: false });
  const { key: shortKey, ...short } = getInputProps(fields.shortName, {
    type: "text",
    ariaAttributes: false,
  });
  const { key: kindKey, ...kind } = getSelectProps(fields.kind, { ariaAttributes: false });
  const { key: stringsKey, ...strings } = getInputProps(fields.strings, {
    type: "text",
    ariaAttributes: false,
  });
  const before = (fields.kind.value ?? "acoustic") as InstrumentKind;
  const stringsBefore = fields.strings.value;
  const bringStrings = (next: InstrumentKind) => {
    if (stringsBefore === String(usualStringsFor(before))) {
      form.update({ name: fields.strings.name, value: String(usualStringsFor(next)) });
    }
  };
  return (
    <div className="flex flex-col gap-4">
      <TextField
        key={nameKey}
        {...name}
        label="Name"
        errors={fields.name.errors}
        maxLength={guitarLimits.name}
        autoComplete="off"
      />
      <TextField
        key={shortKey}
        {...short}
        label="Short name"
        hint="6 letters at most. It stands in the badge on every page and sheet."
        errors={fields.shortName.errors}
        maxLength={guitarLimits.shortName}
        autoComplete="off"
        className="max-w-32 font-display font-semibold"
      />
      <BadgePicker field={fields.badge} shortName={fields.shortName.value ?? ""} />
      <div className="grid grid-cols-[minmax(0,1fr)_6rem] gap-3">
        <SelectField
          key={kindKey}
          {...kind}
          label="Kind"
          errors={fields.kind.errors}
          onChange={(event) => bringStrings(event.target.value as InstrumentKind)}
        >
          {instrumentKinds.map((option) => (
            <option key={option} value={option}>
              {kindWords[option]}
            </option>
          ))}
        </SelectField>
        <TextField
          key={stringsKey}
          {...strings}
          label="Strings"
          errors={fields.strings.errors}
          inputMode="numeric"
          className="tabular"
        />
      </div>
    </div>
  );
}
