import type { FieldMetadata } from "@conform-to/react";
import type { GuitarFormInput } from "#app/domain/repertoire/guitar-form.ts";

/** The fields of a guitar's form, as its parts take them. */
export type GuitarFieldset = {
  [Name in keyof Required<GuitarFormInput>]: FieldMetadata<GuitarFormInput[Name]>;
};
