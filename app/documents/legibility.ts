/** Barlow Condensed's cap height in ems: 700 of 1000 units (read from @fontsource/barlow-condensed 5.3.0). */
export const capHeight = 0.7;

/** Visual angle of a capital that reads without effort, in minutes of arc: ISO 9241-3 prefers 20 to 22. */
export const comfortableAngle = 20;

/**
 * How much shorter a sheet at one's feet looks than one held upright: eye 1.6 m above it and 0.8 m behind it gives a
 * line of sight of 1.789 m and a foreshortening of 0.894.
 */
export const obliqueView = 0.894;

const millimetresPerPoint = 25.4 / 72;

/** 2·tan(α/2) for α in minutes of arc: the height of what is seen at distance 1. */
function heightAtOne(arcMinutes: number): number {
  return 2 * Math.tan(((arcMinutes / 60) * Math.PI) / 180 / 2);
}

/**
 * The distance in metres from which type of a size in points reads, lying on the floor (`view` 1: held upright).
 * From h = 2·d·tan(α/2) for the cap height.
 * @example readingDistance(40.1, 1) // 1.70 (20′, seen straight on)
 */
export function readingDistance(points: number, view = obliqueView): number {
  const millimetres = points * capHeight * millimetresPerPoint;
  return (millimetres * view) / heightAtOne(comfortableAngle) / 1000;
}

/**
 * The size in points that reads from a distance in metres: the inverse of {@link readingDistance}.
 * @example sizeForDistance(1.7, 1) // 40.07
 */
export function sizeForDistance(metres: number, view = obliqueView): number {
  return (metres * 1000 * heightAtOne(comfortableAngle)) / view / capHeight / millimetresPerPoint;
}
