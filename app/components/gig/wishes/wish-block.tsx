import type { FieldMetadata } from "@conform-to/react";
import type { ReactNode } from "react";
import { Field, fieldIds } from "#app/components/ui/field.tsx";

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

type NumberFieldProps = { field: FieldMetadata<string | undefined>; label: string; unit: string };

/** A number of a wish with its unit. */
export function WishNumber({ field, label, unit }: NumberFieldProps) {
  const unitId = `${field.id}-unit`;
  const wrong = field.errors?.length ? fieldIds(field.id).errorId : "";
  return (
    <Field id={field.id} label={label} errors={field.errors} className="min-w-32 flex-1">
      <div className="flex items-center gap-2">
        <input
          id={field.id}
          name={field.name}
          defaultValue={field.initialValue}
          inputMode="numeric"
          aria-invalid={wrong ? true : undefined}
          aria-describedby={`${unitId} ${wrong}`.trim()}
          className="tabular min-h-11 w-16 rounded-sm border border-grey-400 bg-white px-3 text-base aria-[invalid=true]:border-2 aria-[invalid=true]:border-warning"
        />
        <span id={unitId} className="text-grey-600">
          {unit}
        </span>
      </div>
    </Field>
  );
}
