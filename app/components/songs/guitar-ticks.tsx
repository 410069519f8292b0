import { type FieldMetadata, getCollectionProps } from "@conform-to/react";
import { GuitarBadge } from "#app/components/guitar-badge.tsx";
import { Warning } from "#app/components/ui/warning.tsx";
import type { FormGuitar } from "#app/domain/repertoire/form-guitar.ts";

type GuitarTicksProps = {
  field: FieldMetadata<string[] | undefined>;
  guitars: readonly FormGuitar[];
};

/** The guitars a way is kept to. None ticked: any that can play it. */
export function GuitarTicks({ field, guitars }: GuitarTicksProps) {
  const ticks = getCollectionProps(field, {
    type: "checkbox",
    options: guitars.map(({ id }) => id),
    ariaAttributes: false,
  });
  return (
    <fieldset aria-describedby={field.errors ? field.errorId : undefined}>
      <legend className="font-semibold text-base">Only on these guitars</legend>
      <p className="text-grey-600 text-sm">None ticked: any that can play it.</p>
      <div className="mt-1 flex flex-wrap gap-x-5">
        {ticks.map(({ key, ...tick }, index) => {
          const guitar = guitars[index]!;
          return (
            <label key={key} htmlFor={tick.id} className="flex min-h-10 items-center gap-2 text-base">
              <input {...tick} className="size-5 accent-ink" />
              <GuitarBadge shortName={guitar.shortName} shape={guitar.badge} title={guitar.name} />
              {guitar.deleted ? <span className="text-grey-600 text-sm">deleted</span> : null}
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
