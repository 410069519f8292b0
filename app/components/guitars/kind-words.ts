import type { BadgeShape, InstrumentKind } from "#app/domain/repertoire/guitar.ts";

export const kindWords: Record<InstrumentKind, string> = {
  acoustic: "Acoustic guitar",
  electric: "Electric guitar",
  classical: "Classical guitar",
  resonator: "Resonator",
  "twelve-string": "Twelve-string",
  baritone: "Baritone",
  bass: "Bass",
  ukulele: "Ukulele",
  mandolin: "Mandolin",
  banjo: "Banjo",
  other: "Other stringed instrument",
};

export const shapeWords: Record<BadgeShape, string> = {
  round: "Round",
  square: "Square",
  hexagon: "Hexagon",
  cut: "Cut corners",
  slant: "Slanted",
  double: "Double line",
};

const dates = new Intl.DateTimeFormat("en-GB", { dateStyle: "medium", timeZone: "UTC" });

/** A day as it is read: "20 Nov 2026". */
export function dayWords(isoDate: string): string {
  return dates.format(new Date(`${isoDate}T00:00:00Z`));
}
