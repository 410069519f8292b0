import { useId, useState } from "react";
import { usePageTools } from "#app/components/gig/desk/page-context.tsx";
import { OwnWeightsForm } from "#app/components/gig/suggestions/own-weights-form.tsx";
import { aimNames } from "#app/domain/gig/aims.ts";
import type { GigAim } from "#app/domain/gig/gig.ts";
import { defaultAim } from "#app/domain/planning/aim.ts";

const kinds = Object.keys(aimNames) as GigAim["kind"][];

/** What the suggestions keep low. The weights of one's own stay folded until they are asked for. */
export function AimChooser({ aim }: { aim: GigAim }) {
  const { edit, may } = usePageTools();
  const id = useId();
  const [weighing, setWeighing] = useState(false);
  const choose = (next: GigAim) =>
    edit([{ kind: "gig.set", field: "aim", value: next }], `Aim for ${aimNames[next.kind].toLowerCase()}`);
  if (!may.plan)
    return <p className="text-grey-600 leading-snug">Aim: {aimNames[aim.kind].toLowerCase()}.</p>;
  const shown = weighing ? "own" : aim.kind;
  return (
    <div className="flex flex-col gap-2">
      <div className="flex items-center gap-3">
        <label htmlFor={id} className="font-semibold text-base">
          Aim
        </label>
        <select
          id={id}
          value={shown}
          onChange={(event) => {
            const kind = event.currentTarget.value as GigAim["kind"];
            setWeighing(kind === "own");
            if (kind !== "own" && kind !== aim.kind) choose({ kind });
          }}
          className="min-h-11 min-w-0 flex-1 rounded-sm border border-grey-400 bg-white px-1.5 font-display font-medium text-base lg:min-h-9"
        >
          {kinds.map((kind) => (
            <option key={kind} value={kind}>
              {aimNames[kind]}
            </option>
          ))}
        </select>
      </div>
      {shown === "own" ? (
        <details open={weighing}>
          <summary className="w-fit text-sm underline underline-offset-2">Weights</summary>
          <OwnWeightsForm
            key={JSON.stringify(aim)}
            weights={aim.kind === "own" ? aim.weights : defaultAim}
            onUse={(weights) => {
              setWeighing(false);
              choose({ kind: "own", weights });
            }}
          />
        </details>
      ) : null}
    </div>
  );
}
