import type { ComponentProps, ReactNode } from "react";
import { Warning } from "#app/components/ui/warning.tsx";

/** What a field's control needs so that its label, hint and errors are tied to it. */
export type FieldIds = { id: string; hintId: string; errorId: string };

/** Ids for one field; `describedBy` names only what is shown. */
export function fieldIds(id: string): FieldIds {
  return { id, hintId: `${id}-hint`, errorId: `${id}-error` };
}

export function describedBy(
  ids: FieldIds,
  hint: ReactNode,
  errors: string[] | undefined,
): string | undefined {
  const parts = [hint ? ids.hintId : "", errors?.length ? ids.errorId : ""].filter(Boolean);
  return parts.length > 0 ? parts.join(" ") : undefined;
}

type FieldProps = {
  label: ReactNode;
  id: string;
  hint?: ReactNode;
  errors?: string[];
  className?: string;
  children: ReactNode;
};

/** A label above its control, a hint and the errors below it. */
export function Field({ label, id, hint, errors, className = "", children }: FieldProps) {
  const ids = fieldIds(id);
  return (
    <div className={`flex flex-col gap-1 ${className}`}>
      <label htmlFor={id} className="font-semibold text-base">
        {label}
      </label>
      {children}
      {hint ? (
        <p id={ids.hintId} className="text-grey-600 text-sm">
          {hint}
        </p>
      ) : null}
      {errors?.length ? (
        <div id={ids.errorId}>
          {errors.map((error) => (
            <Warning key={error}>{error}</Warning>
          ))}
        </div>
      ) : null}
    </div>
  );
}

const control =
  "w-full min-h-11 rounded-sm border border-grey-400 bg-white px-3 text-base text-ink placeholder:text-grey-600 disabled:bg-grey-100 aria-[invalid=true]:border-warning aria-[invalid=true]:border-2";

type ControlProps = { label: ReactNode; hint?: ReactNode; errors?: string[]; wrapClass?: string };

/** A one-line text field with its label, hint and errors. `id` defaults to `name`. */
export function TextField({
  label,
  hint,
  errors,
  wrapClass,
  id,
  className = "",
  ...rest
}: ComponentProps<"input"> & ControlProps) {
  const fieldId = id ?? rest.name ?? "";
  return (
    <Field label={label} id={fieldId} hint={hint} errors={errors} className={wrapClass}>
      <input
        id={fieldId}
        className={`${control} ${className}`}
        aria-invalid={errors?.length ? true : undefined}
        aria-describedby={describedBy(fieldIds(fieldId), hint, errors)}
        {...rest}
      />
    </Field>
  );
}

export function TextArea({
  label,
  hint,
  errors,
  wrapClass,
  id,
  className = "",
  ...rest
}: ComponentProps<"textarea"> & ControlProps) {
  const fieldId = id ?? rest.name ?? "";
  return (
    <Field label={label} id={fieldId} hint={hint} errors={errors} className={wrapClass}>
      <textarea
        id={fieldId}
        className={`${control} py-2 ${className}`}
        aria-invalid={errors?.length ? true : undefined}
        aria-describedby={describedBy(fieldIds(fieldId), hint, errors)}
        {...rest}
      />
    </Field>
  );
}

export function SelectField({
  label,
  hint,
  errors,
  wrapClass,
  id,
  className = "",
  children,
  ...rest
}: ComponentProps<"select"> & ControlProps) {
  const fieldId = id ?? rest.name ?? "";
  return (
    <Field label={label} id={fieldId} hint={hint} errors={errors} className={wrapClass}>
      <select
        id={fieldId}
        className={`${control} ${className}`}
        aria-invalid={errors?.length ? true : undefined}
        aria-describedby={describedBy(fieldIds(fieldId), hint, errors)}
        {...rest}
      >
        {children}
      </select>
    </Field>
  );
}

/** A tick box with its label on the right and a hint below. */
export function CheckField({
  label,
  hint,
  id,
  ...rest
}: ComponentProps<"input"> & { label: ReactNode; hint?: ReactNode }) {
  const fieldId = id ?? rest.name ?? "";
  return (
    <div className="flex flex-col">
      <label htmlFor={fieldId} className="flex min-h-11 items-center gap-3 font-semibold">
        <input
          id={fieldId}
          type="checkbox"
          className="size-5 accent-ink"
          aria-describedby={hint ? `${fieldId}-hint` : undefined}
          {...rest}
        />
        {label}
      </label>
      {hint ? (
        <p id={`${fieldId}-hint`} className="pl-8 text-grey-600 text-sm">
          {hint}
        </p>
      ) : null}
    </div>
  );
}
