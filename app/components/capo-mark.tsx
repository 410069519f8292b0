import type { Capo } from "#app/domain/music/neck.ts";

/** String numbers as ranges, high numbers first: [1,2,3,4,5] → "5–1", [2,4] → "4, 2". */
export function stringRange(strings: number[]): string {
  const sorted = [...strings].sort((a, b) => b - a);
  const runs: [number, number][] = [];
  for (const string of sorted) {
    const last = runs.at(-1);
    if (last && last[1] === string + 1) last[1] = string;
    else runs.push([string, string]);
  }
  return runs.map(([from, to]) => (from === to ? `${from}` : `${from}–${to}`)).join(", ");
}

/** A capo as a brass mark with its fret; a partial one names the strings it covers. */
export function CapoMark({ capo, strings }: { capo: Capo; strings: number }) {
  const partial = capo.strings.length < strings;
  const words = partial ? `Capo ${capo.fret} over strings ${stringRange(capo.strings)}` : `Capo ${capo.fret}`;
  return (
    <span className="inline-flex items-center gap-1 font-display font-semibold" role="img" aria-label={words}>
      <span
        aria-hidden="true"
        className="inline-flex h-5 min-w-5 items-center justify-center rounded-sm bg-brass px-1 text-sm text-white"
      >
        {capo.fret}
      </span>
      {partial ? (
        <span aria-hidden="true" className="text-grey-800 text-sm">
          {stringRange(capo.strings)}
        </span>
      ) : null}
    </span>
  );
}
