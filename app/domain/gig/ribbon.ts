import type { Row } from "#app/domain/gig/plan.ts";
import { type CapoBar, capoBars } from "#app/domain/gig/ribbon-capos.ts";
import { placeLabels, type StepLabel } from "#app/domain/gig/ribbon-labels.ts";
import { type GuitarStory, guitarStory } from "#app/domain/gig/ribbon-story.ts";
import type { Guitar } from "#app/domain/repertoire/guitar.ts";

export type RibbonRow = Pick<Row, "entry" | "guitar" | "neck" | "gap">;

/** Where rows stand and how wide things may be, in one unit (px on screen, points on paper). */
export type RibbonFrame = {
  /** Top and height of each row, from the top of the drawing. */
  tops: readonly number[];
  heights: readonly number[];
  bottom: number;
  /** Width of an open lane and of a folded one. */
  laneWidth: number;
  foldedWidth: number;
  /** "left" mirrors the strings, as a left-handed player sees the neck. */
  hand: "left" | "right";
  /** Guitars that stay open whatever the rule says. */
  opened?: ReadonlySet<string>;
  /** What a triangle with its number takes. */
  labelWidth: number;
  labelHeight: number;
};

/** A straight piece of a string. `active`: the guitar is being played, or worked on, there. */
export type StringPiece = {
  x1: number;
  y1: number;
  x2: number;
  y2: number;
  active: boolean;
  step: "up" | "down" | null;
};

/** One string through the whole set. `weight` is its line's width: lower strings are thicker. */
export type RibbonString = { string: number; weight: number; pieces: StringPiece[] };

/** Where something is done to this guitar: from y1 to y2, belonging to the gap into `entryId`. */
export type Knot = { entryId: string; y1: number; y2: number; atSide: boolean };

export type RibbonLane = {
  guitar: Guitar;
  /** Drawn as one line: the guitar keeps its tuning, or is not among the four most used. */
  folded: boolean;
  x: number;
  width: number;
  strings: RibbonString[];
  labels: StepLabel[];
  capos: CapoBar[];
  knots: Knot[];
};

/** So many lanes stand open at once. */
const mostOpen = 4;
/** Line widths from the lowest string to the highest, as a neck looks (common practice, no source). */
const thickest = 2.6;
const thinnest = 0.9;

/** Sideways place of a pitch beside its string's usual one, as a share of the distance of two strings: grows less than the interval. */
function sway(semitones: number): number {
  return Math.sign(semitones) * Math.min(0.4, 0.15 * Math.sqrt(Math.abs(semitones)));
}

/** Places of the strings at rest, low string first; mirrored for the left hand. */
function restPlaces(
  count: number,
  width: number,
  hand: "left" | "right",
  labelWidth: number,
): { places: number[]; distance: number } {
  const left = labelWidth * 0.5;
  const distance = (width - left - labelWidth) / Math.max(1, count - 1);
  const places = Array.from({ length: count }, (_, index) => left + index * distance);
  return { places: hand === "left" ? places.reverse() : places, distance };
}

function isActive(story: GuitarStory, y: number): boolean {
  return story.played.some(({ y1, y2 }) => y >= y1 && y < y2);
}

/** One string: straight where its pitch stays, stepping where it is retuned; cut where the guitar is taken up or put down. */
function stringLine(
  story: GuitarStory,
  index: number,
  rest: number,
  distance: number,
  usual: number,
  frame: RibbonFrame,
): StringPiece[] {
  const x = (pitch: number) => rest + sway(pitch - usual) * distance;
  const pieces: StringPiece[] = [];
  let y = frame.tops[0] ?? 0;
  let pitch = story.first[index] ?? usual;
  const cuts = story.played.flatMap(({ y1, y2 }) => [y1, y2]).sort((a, b) => a - b);
  const straightTo = (end: number) => {
    for (const cut of [...cuts.filter((one) => one > y && one < end), end]) {
      if (cut > y)
        pieces.push({
          x1: x(pitch),
          y1: y,
          x2: x(pitch),
          y2: cut,
          active: isActive(story, (y + cut) / 2),
          step: null,
        });
      y = Math.max(y, cut);
    }
  };
  for (const work of story.works) {
    const change = work.strings.find((one) => one.index === index);
    if (!change) continue;
    straightTo(work.y1);
    pieces.push({
      x1: x(pitch),
      y1: work.y1,
      x2: x(change.to),
      y2: work.y2,
      active: true,
      step: change.to > pitch ? "up" : "down",
    });
    pitch = change.to;
    y = work.y2;
  }
  straightTo(frame.bottom);
  return pieces;
}

function laneOf(
  guitar: Guitar,
  rows: readonly RibbonRow[],
  x: number,
  folded: boolean,
  frame: RibbonFrame,
): RibbonLane {
  const story = guitarStory(guitar, rows, frame);
  const width = folded ? frame.foldedWidth : frame.laneWidth;
  const knots = story.works.map(({ entryId, y1, y2, atSide }) => ({ entryId, y1, y2, atSide }));
  if (folded) {
    const calm = { ...story, works: [] };
    const pieces = stringLine(calm, 0, width / 2, 0, 0, frame);
    return {
      guitar,
      folded,
      x,
      width,
      strings: [{ string: 1, weight: thickest, pieces }],
      labels: [],
      capos: [],
      knots,
    };
  }
  const { places, distance } = restPlaces(guitar.strings, width, frame.hand, frame.labelWidth);
  const strings = places.map(
    (rest, index): RibbonString => ({
      string: guitar.strings - index,
      weight: thickest - ((thickest - thinnest) * index) / Math.max(1, guitar.strings - 1),
      pieces: stringLine(story, index, rest, distance, guitar.usual[index] ?? 0, frame),
    }),
  );
  const labels = story.works.flatMap((work) =>
    placeLabels(
      work.strings.map((change) => {
        const piece = strings[change.index]?.pieces.find((one) => one.step !== null && one.y1 === work.y1);
        return {
          string: guitar.strings - change.index,
          direction: change.to > change.from ? ("up" as const) : ("down" as const),
          semitones: Math.abs(change.to - change.from),
          x: Math.max(piece?.x1 ?? 0, piece?.x2 ?? 0) + 2,
          entryId: work.entryId,
        };
      }),
      { y1: work.y1, y2: work.y2, width, labelWidth: frame.labelWidth, labelHeight: frame.labelHeight },
    ),
  );
  return {
    guitar,
    folded,
    x,
    width,
    strings,
    labels,
    capos: capoBars(story, places, distance, guitar, frame),
    knots,
  };
}

/**
 * The ribbons of a set: one lane for each guitar that is used, in the act's order. Plain numbers: the page draws them
 * as SVG, a sheet as PDF, a suggestion as a thumbnail.
 * @example ribbonLanes(plan.rows, guitars, frame)[0].strings.length // 6
 */
export function ribbonLanes(
  rows: readonly RibbonRow[],
  guitars: readonly Guitar[],
  frame: RibbonFrame,
): RibbonLane[] {
  const uses = new Map<string, number>();
  for (const { guitar } of rows) if (guitar) uses.set(guitar.id, (uses.get(guitar.id) ?? 0) + 1);
  const used = guitars.filter((guitar) => uses.has(guitar.id));
  const open = new Set(
    used
      .filter((guitar) => !guitar.keeps)
      .toSorted((a, b) => (uses.get(b.id) ?? 0) - (uses.get(a.id) ?? 0))
      .slice(0, mostOpen)
      .map((guitar) => guitar.id),
  );
  let x = 0;
  return used.map((guitar) => {
    const folded = !open.has(guitar.id) && !frame.opened?.has(guitar.id);
    const lane = laneOf(guitar, rows, x, folded, frame);
    x += lane.width;
    return lane;
  });
}
