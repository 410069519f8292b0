import { type FieldMetadata, getInputProps } from "@conform-to/react";
import type { ComponentProps } from "react";
import { TextField } from "#app/components/ui/field.tsx";

type TextInputProps = Pick<
  ComponentProps<typeof TextField>,
  "label" | "hint" | "autoComplete" | "placeholder"
> & {
  field: FieldMetadata<string>;
  type?: "text" | "email" | "password";
};

/** A text field of a form: what was typed and what is wrong with it come from the form. */
export function TextInput({ field, type = "text", ...rest }: TextInputProps) {
  const { key, ...input } = getInputProps(field, { type, ariaAttributes: false });
  return (
    <TextField
      key={key}
      {...input}
      {...rest}
      errors={field.errors}
      {...(type === "email" ? { spellCheck: false, autoCapitalize: "none" } : {})}
    />
  );
}
