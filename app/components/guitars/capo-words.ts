import { stringRange } from "#app/components/capo-mark.tsx";

/** What a kind of capo covers, in words: "All strings", "Strings 5–3". */
export function coverWords(strings: number[] | null): string {
  if (strings === null) return "All strings";
  return strings.length === 1 ? `String ${strings[0]}` : `Strings ${stringRange(strings)}`;
}
