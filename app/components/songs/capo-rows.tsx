import { Minus, Plus, X } from "lucide-react";
import { Button } from "#app/components/ui/button.tsx";
import { allStrings, highestCapoFret, sameCapo } from "#app/domain/music/capo.ts";
import type { Capo } from "#app/domain/music/neck.ts";

type CapoRowsProps = {
  capos: readonly Capo[];
  strings: number;
  onChange: (capos: Capo[]) => void;
  most: number;
  /** Which way of playing the song these belong to, for those who hear the page. */
  within: string;
};

/** The capos of a neck to be set by hand: fret by fret and string by string. Writes what the capo field then says. */
export function CapoRows({ capos, strings, onChange, most, within }: CapoRowsProps) {
  const replace = (index: number, capo: Capo) => {
    const others = capos.filter((_, place) => place !== index);
    if (!others.some((other) => sameCapo(other, capo))) onChange(capos.with(index, capo));
  };
  const nextFret = Math.min(highestCapoFret, Math.max(0, ...capos.map((capo) => capo.fret)) + 2);
  return (
    <div className="flex flex-col items-start gap-2">
      {capos.map((capo, index) => (
        <CapoRow
          // biome-ignore lint/suspicious/noArrayIndexKey: a capo that moves to another fret is still the same row
          key={index}
          capo={capo}
          strings={strings}
          within={within}
          onChange={(changed) => replace(index, changed)}
          onRemove={() => onChange(capos.toSpliced(index, 1))}
        />
      ))}
      {capos.length < most ? (
        <Button
          small
          look="quiet"
          className="-ml-2.5"
          onClick={() => onChange([...capos, { fret: nextFret, strings: allStrings(strings) }])}
        >
          <Plus size={15} aria-hidden="true" />
          {capos.length === 0 ? "Put a capo on" : "Another capo"}
        </Button>
      ) : null}
    </div>
  );
}

type CapoRowProps = {
  capo: Capo;
  strings: number;
  within: string;
  onChange: (capo: Capo) => void;
  onRemove: () => void;
};

function CapoRow({ capo, strings, within, onChange, onRemove }: CapoRowProps) {
  const toggle = (string: number) => {
    const covered = capo.strings.includes(string)
      ? capo.strings.filter((other) => other !== string)
      : [...capo.strings, string];
    if (covered.length > 0) onChange({ ...capo, strings: covered });
  };
  return (
    <fieldset className="flex flex-wrap items-center gap-x-2 gap-y-2">
      <legend className="sr-only">{`${within}, capo ${capo.fret}`}</legend>
      <div className="flex items-center">
        <Step
          label={`Capo ${capo.fret}: one fret lower`}
          disabled={capo.fret <= 1}
          onClick={() => onChange({ ...capo, fret: capo.fret - 1 })}
        >
          <Minus size={14} aria-hidden="true" />
        </Step>
        <span className="flex h-8 w-9 items-center pointer-coarse:h-11 justify-center bg-brass font-display font-semibold text-white tabular">
          {capo.fret}
        </span>
        <Step
          label={`Capo ${capo.fret}: one fret higher`}
          disabled={capo.fret >= highestCapoFret}
          onClick={() => onChange({ ...capo, fret: capo.fret + 1 })}
        >
          <Plus size={14} aria-hidden="true" />
        </Step>
      </div>
      <div className="flex">
        {allStrings(strings).map((string) => {
          const covered = capo.strings.includes(string);
          return (
            <button
              key={string}
              type="button"
              aria-pressed={covered}
              aria-label={`Capo ${capo.fret} over string ${string}`}
              onClick={() => toggle(string)}
              className={`-ml-px h-8 border pointer-coarse:h-11 font-display font-semibold text-sm tabular first:ml-0 ${strings > 8 ? "w-6" : "w-8"} ${
                covered
                  ? "border-brass bg-brass text-white"
                  : "border-grey-400 bg-white text-grey-800 hover:bg-grey-100"
              }`}
            >
              {string}
            </button>
          );
        })}
      </div>
      <Button
        small
        look="quiet"
        aria-label={`Take capo ${capo.fret} off`}
        title="Take it off"
        onClick={onRemove}
      >
        <X size={15} aria-hidden="true" />
      </Button>
    </fieldset>
  );
}

function Step({
  label,
  ...rest
}: {
  label: string;
  disabled: boolean;
  onClick: () => void;
  children: React.ReactNode;
}) {
  return (
    <button
      type="button"
      aria-label={label}
      title={label}
      className="flex h-8 w-7 items-center pointer-coarse:h-11 pointer-coarse:w-9 justify-center border border-grey-400 bg-white hover:bg-grey-100 disabled:opacity-40"
      {...rest}
    />
  );
}
