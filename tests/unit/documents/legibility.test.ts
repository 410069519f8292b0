import { describe, expect, test } from "vitest";
import { textWidth } from "#app/documents/fonts.ts";
import { capHeight, comfortableAngle, readingDistance, sizeForDistance } from "#app/documents/legibility.ts";

describe("how far type reads", () => {
  // ISO 9241-3 (quoted by IBM/Lenovo "Character size"): capital heights of 20 to 22 minutes of arc are preferred.
  // h = 2·d·tan(α/2): at 20′ a capital is 9.31 mm at 1.6 m, 9.89 mm at 1.7 m, 10.47 mm at 1.8 m.
  test.each([
    [1.6, 9.31, 37.7],
    [1.7, 9.89, 40.1],
    [1.8, 10.47, 42.4],
  ])("from %s m, seen straight on, a capital of %s mm, %s pt", (metres, millimetres, points) => {
    expect(comfortableAngle).toBe(20);
    expect(sizeForDistance(metres, 1)).toBeCloseTo(points, 1);
    expect((sizeForDistance(metres, 1) * capHeight * 25.4) / 72).toBeCloseTo(millimetres, 2);
    expect(readingDistance(sizeForDistance(metres, 1), 1)).toBeCloseTo(metres, 10);
  });

  test("NUREG-0700 rev 2 §1.3.1-4 gives the same height: H = 6.283·D·MA/21600", () => {
    const millimetres = (6.283 * 1700 * 20) / 21600;
    expect((sizeForDistance(1.7, 1) * capHeight * 25.4) / 72).toBeCloseTo(millimetres, 1);
  });

  test("a sheet on the floor must be set larger, by 1 / 0.894", () => {
    expect(sizeForDistance(1.7)).toBeCloseTo(sizeForDistance(1.7, 1) / 0.894, 6);
  });
});

describe("how wide type is", () => {
  test("DADGAD in Barlow Condensed 600 is 2.762 em (read from the font file)", () => {
    expect(textWidth("DADGAD", 600)).toBeCloseTo(2.762, 3);
  });

  test("♭ and Ł are measured in the face that has them", () => {
    expect(textWidth("E♭", 600)).toBeGreaterThan(textWidth("E", 600) + 0.2);
    expect(textWidth("Łódź", 600)).toBeGreaterThan(1);
  });
});
