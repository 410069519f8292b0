import { type FieldMetadata, getCollectionProps } from "@conform-to/react";
import { GuitarBadge } from "#app/components/guitar-badge.tsx";
import { shapeWords } from "#app/components/guitars/kind-words.ts";
import { Warning } from "#app/components/ui/warning.tsx";
import { type BadgeShape, badgeShapes } from "#app/domain/repertoire/guitar.ts";

/** The shapes a badge may have, each drawn around the short name as it is being typed. */
export function BadgePicker({ field, shortName }: { field: FieldMetadata<BadgeShape>; shortName: string }) {
  const radios = getCollectionProps(field, {
    type: "radio",
    options: [...badgeShapes],
    ariaAttributes: false,
  });
  return (
    <fieldset aria-describedby={field.errors ? field.errorId : undefined}>
      <legend className="font-semibold text-base">Badge</legend>
      <div className="mt-1 grid grid-cols-3 gap-px border border-grey-200 bg-grey-200">
        {radios.map(({ key, ...radio }, index) => {
          const shape = badgeShapes[index]!;
          return (
            <label
              key={key}
              htmlFor={radio.id}
              className="relative flex min-h-14 flex-col items-center justify-center gap-1 bg-white py-2 has-checked:bg-grey-100 has-checked:shadow-[inset_0_-3px_0_var(--color-ink)] has-focus-visible:outline-2 has-focus-visible:outline-ink"
            >
              <input {...radio} className="absolute inset-0 cursor-pointer opacity-0" />
              <span aria-hidden="true">
                <GuitarBadge shortName={shortName.slice(0, 6) || "Name"} shape={shape} />
              </span>
              <span className="text-grey-600 text-xs">{shapeWords[shape]}</span>
            </label>
          );
        })}
      </div>
      {field.errors ? (
        <div id={field.errorId}>
          {field.errors.map((error) => (
            <Warning key={error}>{error}</Warning>
          ))}
        </div>
      ) : null}
    </fieldset>
  );
}
