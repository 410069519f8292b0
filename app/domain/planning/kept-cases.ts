import { tuningOf, withoutRetuningKept } from "#app/domain/planning/kept-tunings.ts";
import { type Model, UNUSED } from "#app/domain/planning/model.ts";

/** More cases than this are not told apart. */
const MOST_CASES = 12;

/**
 * The cases there are for guitars that keep their tuning and are prepared freely: a tuning for each, as the model without
 * its other ways on them. Every plan belongs to a case, since such a guitar has one tuning throughout (one that is not used
 * fits all of them); cases in which some song could not be played are left out.
 *
 * @returns one model, the given one, where there is nothing to tell apart; guitars are left as they are where there would be
 *   too many cases
 */
export function keptCases(model: Model): Model[] {
  let cases = [model];
  for (let guitar = 0; guitar < model.guitars; guitar += 1) {
    if (!model.keeps[guitar] || model.start[guitar] !== UNUSED) continue;
    const own = model.options.flat().filter((option) => option.guitar === guitar);
    const tunings = [...new Set(own.map(({ neck }) => tuningOf(model, neck)))];
    if (tunings.length < 2 || tunings.length * cases.length > MOST_CASES) continue;
    cases = cases.flatMap((one) =>
      tunings.map((tuning): Model => {
        const fits = ({ guitar: on, neck }: { guitar: number; neck: number }) =>
          on !== guitar || tuningOf(model, neck) === tuning;
        return withoutRetuningKept({ ...one, options: one.options.map((list) => list.filter(fits)) });
      }),
    );
  }
  return cases.filter(({ options }) => options.every((list) => list.length > 0));
}
