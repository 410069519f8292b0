import { type Lead, leadOf } from "#app/domain/gig/lead.ts";
import type { Totals } from "#app/domain/planning/answer.ts";

type Measured = { total: number; totals: Totals };
type Counted = Exclude<Lead, "own">;

const order: readonly Counted[] = ["dead-air", "strings", "capos", "guitars"];

const names: Record<Counted, [one: string, many: string]> = {
  "dead-air": ["s", "s"],
  strings: ["string", "strings"],
  capos: ["capo change", "capo changes"],
  guitars: ["guitar change", "guitar changes"],
};

function difference(kind: Counted, now: Measured, then: Measured): string[] {
  const less = Math.round(leadOf(kind, now)) - Math.round(leadOf(kind, then));
  if (less === 0) return [];
  const count = Math.abs(less);
  const fewer = kind === "dead-air" ? "less" : "fewer";
  return [`${count} ${names[kind][count === 1 ? 0 : 1]} ${less > 0 ? fewer : "more"}`];
}

/**
 * How two orders differ in what hands must do, what leads first; what is the same is not told.
 * @example savedWords("strings", now, then) // ["8 strings fewer", "79 s less", "2 guitar changes more"]
 */
export function savedWords(lead: Lead, now: Measured, then: Measured): string[] {
  const first = order.filter((kind) => kind === lead);
  return [...first, ...order.filter((kind) => kind !== lead)].flatMap((kind) => difference(kind, now, then));
}

/**
 * What an order needs besides what leads, for the small print of a suggestion; broken wishes too, as the seconds they
 * count as.
 * @example workWords("dead-air", answer) // "21 strings, 1 capo, 5 guitar changes"
 * @example workWords("capos", answer) // "233 s dead air, 21 strings, 5 guitar changes"
 */
export function workWords(lead: Lead, measured: Measured): string {
  const count = (kind: Counted) => Math.round(leadOf(kind, measured));
  const changes = (["capos", "guitars"] as const)
    .filter((kind) => kind !== lead)
    .map((kind) => `${count(kind)} ${kind === "capos" ? "capo" : "guitar"}`);
  const last = lead === "guitars" ? count("capos") : count("guitars");
  return [
    lead === "dead-air" ? "" : `${count("dead-air")} s dead air`,
    lead === "strings" ? "" : `${count("strings")} ${names.strings[count("strings") === 1 ? 0 : 1]}`,
    `${changes.join(", ")} ${last === 1 ? "change" : "changes"}`,
    measured.totals.wishes ? `wishes ${Math.round(measured.totals.wishes)} s` : "",
  ]
    .filter(Boolean)
    .join(", ");
}

/**
 * How much less of what leads there is than now, to stand before the figure; empty where it is the same.
 * @example leadChange("dead-air", now, then) // "−34"
 */
export function leadChange(lead: Lead, now: Measured, then: Measured): string {
  const change = Math.round(leadOf(lead, then)) - Math.round(leadOf(lead, now));
  return change === 0 ? "" : change > 0 ? `+${change}` : `−${-change}`;
}

/**
 * The figure that leads and what it counts, apart, so that the figure can be set large.
 * @example leadFigure("strings", answer) // { value: "11", unit: "strings" }
 */
export function leadFigure(lead: Lead, measured: Measured): { value: string; unit: string } {
  const value = leadOf(lead, measured);
  if (lead === "own") return { value: String(Math.round(value * 10) / 10), unit: "weighed" };
  const count = Math.round(value);
  return { value: String(count), unit: names[lead][count === 1 ? 0 : 1] };
}
