import { useState } from "react";
import { usePageTools } from "#app/components/gig/desk/page-context.tsx";
import { concerns, ruleWords } from "#app/components/gig/dialogs/rule-words.ts";
import { type Part, placeOf } from "#app/components/gig/sets/moves.ts";
import { Button } from "#app/components/ui/button.tsx";
import { SelectField } from "#app/components/ui/field.tsx";
import type { Edit } from "#app/domain/gig/edit.ts";
import type { Entry, Gig, Rule } from "#app/domain/gig/gig.ts";
import { entriesOf, ruleId } from "#app/domain/gig/order.ts";

type RulesFormProps = { entry: Entry; gig: Gig; parts: Part[]; titleOf: (entryId: string) => string };

/** The rules of one song: those it has, and what can be asked of its place and its neighbours. */
export function RulesForm({ entry, gig, parts, titleOf }: RulesFormProps) {
  const { edit } = usePageTools();
  const rules = gig.rules.filter((rule) => concerns(rule, entry.id));
  const title = titleOf(entry.id);
  const fixed = rules.find((rule) => rule.kind === "at");
  const fix = (place: number) => {
    const rule: Rule = { id: ruleId("at", entry.id), kind: "at", entry: entry.id, place };
    const edits: Edit[] = fixed ? [{ kind: "rule.remove", ruleId: fixed.id }] : [];
    edit([...edits, { kind: "rule.add", rule }], `Rule: ${ruleWords(rule, entry.section, titleOf)}`);
  };
  const place = (placeOf(parts, entry.id)?.index ?? 0) + 1;
  return (
    <>
      {rules.length === 0 ? (
        <p className="text-grey-600">No rules: this song may go anywhere in its section.</p>
      ) : (
        <ul className="flex flex-col">
          {rules.map((rule) => (
            <li
              key={rule.id}
              className="flex min-h-11 items-center justify-between gap-3 border-grey-200 border-b"
            >
              <span>{ruleWords(rule, entry.section, titleOf)}</span>
              <Button
                small
                onClick={() => edit([{ kind: "rule.remove", ruleId: rule.id }], `Remove a rule of ${title}`)}
              >
                Remove rule
              </Button>
            </li>
          ))}
        </ul>
      )}
      <div className="flex flex-col gap-2">
        <h3 className="font-semibold text-lg">Its place</h3>
        <div className="flex flex-wrap gap-2">
          <Button small onClick={() => fix(1)}>
            Opener
          </Button>
          <Button small onClick={() => fix(-1)}>
            Closer
          </Button>
          <Button small onClick={() => fix(place)}>
            Keep at place {place}
          </Button>
        </div>
      </div>
      <PairRule entry={entry} gig={gig} titleOf={titleOf} />
    </>
  );
}

type PairKind = "into" | "from" | "before" | "after" | "apart";

function pairRule(kind: PairKind, entryId: string, other: string): Rule {
  if (kind === "apart") return { id: ruleId("apart", entryId, other), kind, a: entryId, b: other };
  const forward = kind === "into" || kind === "before";
  const [a, b] = forward ? [entryId, other] : [other, entryId];
  const named = kind === "into" || kind === "from" ? "into" : "before";
  return { id: ruleId(named, a, b), kind: named, a, b };
}

function PairRule({ entry, gig, titleOf }: Omit<RulesFormProps, "parts">) {
  const { edit } = usePageTools();
  const others = entriesOf(gig, entry.setId).filter((other) => other.id !== entry.id);
  const [kind, setKind] = useState<PairKind>("into");
  const [other, setOther] = useState(others[0]?.id ?? "");
  if (others.length === 0) return null;
  const add = () => {
    const rule = pairRule(kind, entry.id, other);
    edit([{ kind: "rule.add", rule }], `Rule: ${ruleWords(rule, entry.section, titleOf)}`);
  };
  return (
    <div className="flex flex-col gap-2">
      <h3 className="font-semibold text-lg">With another song</h3>
      <div className="flex flex-wrap items-end gap-2">
        <SelectField
          id="pair-kind"
          label={titleOf(entry.id)}
          wrapClass="flex-1 min-w-40"
          value={kind}
          onChange={(event) => setKind(event.currentTarget.value as PairKind)}
        >
          <option value="into">goes straight into</option>
          <option value="from">comes straight out of</option>
          <option value="before">comes before</option>
          <option value="after">comes after</option>
          <option value="apart">stays apart from</option>
        </SelectField>
        <SelectField
          id="pair-other"
          label="The other song"
          wrapClass="flex-1 min-w-40"
          value={other}
          onChange={(event) => setOther(event.currentTarget.value)}
        >
          {others.map((candidate) => (
            <option key={candidate.id} value={candidate.id}>
              {titleOf(candidate.id)}
            </option>
          ))}
        </SelectField>
        <Button onClick={add}>Add rule</Button>
      </div>
    </div>
  );
}
