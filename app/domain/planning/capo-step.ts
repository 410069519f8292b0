import { emptyShelf, prepareGuitar, putCaposOn } from "#app/domain/planning/capo-shelf.ts";
import { type Model, UNUSED } from "#app/domain/planning/model.ts";
import type { SetLayout } from "#app/domain/planning/set-layout.ts";

/** What a song's capos mean for its guitar: the neck it is found with, and how many capos others had to give. */
export type CapoStep = { from: number; taken: number; fromHand: number };

/**
 * Hands out the scarce capos of one more song: `child`, which holds the state before it, gets the necks that others are left
 * with, and what is known of the capos after it. The neck of the guitar itself is left to the caller.
 *
 * @returns null where no kind of capo is scarce
 */
export function capoStep(
  model: Model,
  layout: SetLayout,
): ((child: Int32Array, guitar: number, to: number) => CapoStep) | null {
  const { capos } = model;
  if (!capos) return null;
  const { kinds, carried, without } = capos;
  const shelf = emptyShelf([...capos.counts], model.guitars);
  const needs = new Int32Array(kinds);
  const step: CapoStep = { from: UNUSED, taken: 0, fromHand: 0 };

  function read(child: Int32Array): void {
    for (let guitar = 0; guitar < model.guitars; guitar += 1) {
      const neck = child[layout.necks + guitar]!;
      for (let kind = 0; kind < kinds; kind += 1)
        shelf.carried[guitar * kinds + kind] = neck === UNUSED ? 0 : carried[neck * kinds + kind]!;
      shelf.laidAside[guitar] = capos!.ordered ? child[layout.laidAside + guitar]! : 0;
    }
    for (let kind = 0; kind < kinds; kind += 1) shelf.untouched[kind] = child[layout.untouched + kind]!;
  }

  /** The guitar in hand is now the one played last; the others keep their order. */
  function layAside(child: Int32Array, guitar: number): void {
    const at = layout.laidAside;
    const own = child[at + guitar]!;
    let last = 0;
    for (let other = 0; other < model.guitars; other += 1) {
      if (own > 0 && child[at + other]! > own) child[at + other]! -= 1;
      if (other !== guitar) last = Math.max(last, child[at + other]!);
    }
    child[at + guitar] = last + 1;
  }

  return (child, guitar, to) => {
    read(child);
    for (let kind = 0; kind < kinds; kind += 1) needs[kind] = carried[to * kinds + kind]!;
    step.from = child[layout.necks + guitar]!;
    step.taken = 0;
    step.fromHand = 0;
    if (step.from === UNUSED) {
      prepareGuitar(shelf, guitar, needs);
      let neck = to;
      for (let kind = 0; kind < kinds; kind += 1)
        for (let lack = needs[kind]! - shelf.carried[guitar * kinds + kind]!; lack > 0; lack -= 1)
          neck = without[neck * kinds + kind]!;
      if (neck !== to) step.from = neck;
    }
    const hand = child[layout.current]!;
    putCaposOn(shelf, guitar, needs, (kind, giver) => {
      step.taken += 1;
      if (giver === hand) step.fromHand += 1;
      child[layout.necks + giver] = without[child[layout.necks + giver]! * kinds + kind]!;
    });
    for (let kind = 0; kind < kinds; kind += 1) child[layout.untouched + kind] = shelf.untouched[kind]!;
    if (capos.ordered) layAside(child, guitar);
    return step;
  };
}
