import type { Totals } from "#app/domain/planning/answer.ts";

function counted(count: number, one: string, many: string): string {
  return `${count} ${count === 1 ? one : many}`;
}

/**
 * What an order needs besides dead air, for the small print of a suggestion.
 * @example workWords({ strings: 21, capoActions: 1, swaps: 5, … }) // "21 strings, 1 capo change, 5 guitar changes"
 */
export function workWords(totals: Pick<Totals, "strings" | "capoActions" | "swaps">): string {
  return [
    counted(totals.strings, "string", "strings"),
    counted(totals.capoActions, "capo change", "capo changes"),
    counted(totals.swaps, "guitar change", "guitar changes"),
  ].join(", ");
}
