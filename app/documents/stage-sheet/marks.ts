import type { Weight } from "#app/documents/fonts.ts";
import type { BadgeShape } from "#app/domain/repertoire/guitar.ts";

/** What a piece of text is for; the first four are what the reading distance is measured by. */
export type TextRole = "title" | "tuning" | "capo" | "action" | "number" | "small";

/** Something drawn on a page, in points from its top left corner. A text stands on its baseline `y`. */
export type Mark =
  | {
      kind: "text";
      role: TextRole;
      text: string;
      x: number;
      y: number;
      width: number;
      size: number;
      weight: Weight;
      align: "left" | "right" | "center";
      inverted: boolean;
    }
  | { kind: "rule"; x: number; y: number; width: number; thickness: number }
  | { kind: "cell"; x: number; y: number; width: number; height: number }
  | { kind: "badge"; shape: BadgeShape; x: number; y: number; width: number; height: number }
  | { kind: "triangle"; direction: "up" | "down"; x: number; y: number; size: number; inverted: boolean };

export type SheetPage = {
  marks: Mark[];
  /** Points: the smallest size that a title, tuning, capo or action on this page is set in. */
  smallest: number;
};
