import { TZDate } from "@date-fns/tz";
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { addDays, dateWords, instantOf, isZone, localTime } from "#app/domain/gig/local-time.ts";

describe("local time", () => {
  it("is what the clock on the wall shows", () => {
    expect(localTime("2027-07-02T19:30:00.000Z", "Europe/Dublin")).toEqual({
      date: "2027-07-02",
      time: "20:30",
    });
    expect(localTime("2027-01-01T00:15:00.000Z", "America/St_Johns")).toEqual({
      date: "2026-12-31",
      time: "20:45",
    });
    expect(localTime("2027-01-01T00:00:00.000Z", "UTC")).toEqual({ date: "2027-01-01", time: "00:00" });
  });

  /** Summer time in Ireland began on 28 March 2027 and ends on 31 October 2027, at 01:00 UTC: Directive 2000/84/EC. */
  it("skips an hour in spring and has the first of two in autumn", () => {
    expect(instantOf({ date: "2027-03-28", time: "00:59" }, "Europe/Dublin")).toBe(
      "2027-03-28T00:59:00.000Z",
    );
    expect(instantOf({ date: "2027-03-28", time: "01:30" }, "Europe/Dublin")).toBeNull();
    expect(instantOf({ date: "2027-03-28", time: "02:00" }, "Europe/Dublin")).toBe(
      "2027-03-28T01:00:00.000Z",
    );
    expect(instantOf({ date: "2027-10-31", time: "01:30" }, "Europe/Dublin")).toBe(
      "2027-10-31T00:30:00.000Z",
    );
  });

  it("is none on a day there is not, and none that is no time", () => {
    for (const [date, time] of [
      ["2027-02-29", "20:00"],
      ["2027-13-01", "20:00"],
      ["27-1-1", "20:00"],
      ["2027-01-01", "24:00"],
    ] as const) {
      expect(instantOf({ date, time }, "UTC")).toBeNull();
    }
  });

  it("knows zones from other words", () => {
    expect(["Europe/Dublin", "UTC", "America/Argentina/Salta"].map(isZone)).toEqual([true, true, true]);
    expect(["Dublin", "", "Europe/", "+25:00", "x".repeat(70)].map(isZone)).toEqual([
      false,
      false,
      false,
      false,
      false,
    ]);
  });

  it("agrees with the date library there and back, in every kind of zone", () => {
    const zone = fc.constantFrom(
      "Europe/Dublin",
      "America/New_York",
      "Australia/Lord_Howe",
      "Asia/Kathmandu",
      "Pacific/Apia",
      "America/St_Johns",
      "Africa/Casablanca",
    );
    const minute = fc.integer({ min: Date.UTC(2005, 0) / 60_000, max: Date.UTC(2060, 0) / 60_000 });
    fc.assert(
      fc.property(minute, zone, (minutes, place) => {
        const instant = new Date(minutes * 60_000).toISOString();
        const wall = localTime(instant, place);
        expect(`${wall.date}T${wall.time}`).toBe(new TZDate(instant, place).toISOString().slice(0, 16));
        const back = instantOf(wall, place);
        expect(back === instant || localTime(back!, place).time === wall.time).toBe(true);
        expect(Date.parse(back!)).toBeLessThanOrEqual(minutes * 60_000);
      }),
      { numRuns: 400 },
    );
  });

  it("adds days over months and leap days, and writes them in words", () => {
    expect(addDays("2027-02-26", 7)).toBe("2027-03-05");
    expect(addDays("2028-02-28", 1)).toBe("2028-02-29");
    expect(dateWords("2027-03-12")).toBe("Fri 12 March 2027");
    expect(dateWords("2026-12-01")).toBe("Tue 1 Dec 2026");
  });
});
