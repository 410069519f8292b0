import type { FieldMetadata } from "@conform-to/react";
import type { ReactNode } from "react";
import { TextField } from "#app/components/ui/field.tsx";

type WishBlockProps = {
  on: FieldMetadata<boolean | undefined>;
  title: string;
  children: ReactNode;
};

/** One wish: a tick, and under it what is wished exactly. What was written stays while the tick is off. */
export function WishBlock({ on, title, children }: WishBlockProps) {
  return (
    <fieldset className="group border-grey-200 border-t pt-1">
      <label className="flex min-h-11 items-center gap-3 font-semibold text-base">
        <input
          type="checkbox"
          id={on.id}
          name={on.name}
          defaultChecked={on.initialValue === "on"}
          className="size-5 accent-ink"
        />
        {title}
      </label>
      <div className="hidden flex-col gap-3 pb-4 pl-8 group-has-checked:flex">{children}</div>
    </fieldset>
  );
}

type NumberFieldProps = { field: FieldMetadata<string | undefined>; label: string };

/** A number of a wish, beside its label. */
export function WishNumber({ field, label }: NumberFieldProps) {
  return (
    <TextField
      id={field.id}
      name={field.name}
      defaultValue={field.initialValue}
      errors={field.errors}
      label={label}
      inputMode="numeric"
      className="tabular max-w-28"
      wrapClass="flex-1 min-w-32"
    />
  );
}
