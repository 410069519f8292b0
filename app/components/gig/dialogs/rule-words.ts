import type { Entry, Rule } from "#app/domain/gig/gig.ts";

const ordinals = ["first", "second", "third", "fourth", "fifth"];

function placeWords(place: number): string {
  const name = ordinals[Math.abs(place) - 1];
  if (place > 0) return name ?? `number ${place}`;
  return place === -1 ? "last" : name ? `${name} from the end` : `number ${-place} from the end`;
}

/**
 * A rule in words, as it reads in the list of one song's rules.
 * @example ruleWords({ kind: "into", a: "e1", b: "e2", … }, "set", titleOf) // "Low Meadow goes straight into Glasshouse"
 */
export function ruleWords(
  rule: Rule,
  section: Entry["section"],
  titleOf: (entryId: string) => string,
): string {
  const where = section === 0 ? "the set" : "the encore";
  switch (rule.kind) {
    case "at":
      if (rule.place === 1) return `Opener of ${where}`;
      if (rule.place === -1) return `Closer of ${where}`;
      return `Stays ${placeWords(rule.place)} in ${where}`;
    case "before":
      return `${titleOf(rule.a)} comes before ${titleOf(rule.b)}`;
    case "into":
      return `${titleOf(rule.a)} goes straight into ${titleOf(rule.b)}`;
    case "apart":
      return `${titleOf(rule.a)} and ${titleOf(rule.b)} stay apart`;
  }
}

/** Whether a rule is about this entry. */
export function concerns(rule: Rule, entryId: string): boolean {
  return rule.kind === "at" ? rule.entry === entryId : rule.a === entryId || rule.b === entryId;
}
