import { Lock, LockOpen } from "lucide-react";
import { usePageTools } from "#app/components/gig/desk/page-context.tsx";
import type { Rule } from "#app/domain/gig/gig.ts";

/** Short words for the rules of one entry, as they stand beside its title. */
export function ruleTags(rules: readonly Rule[], entryId: string): string[] {
  const tags: string[] = [];
  let others = 0;
  for (const rule of rules) {
    if (rule.kind === "at" && rule.place === 1) tags.push("opener");
    else if (rule.kind === "at" && rule.place === -1) tags.push("closer");
    else if (rule.kind === "at")
      tags.push(rule.place > 0 ? `place ${rule.place}` : `place ${-rule.place} from the end`);
    else if (rule.kind === "into" && rule.a === entryId) tags.push("straight into");
    else if (rule.kind !== "into") others += 1;
  }
  if (others > 0) tags.push(others === 1 ? "1 rule" : `${others} rules`);
  return tags;
}

type RowTagsProps = {
  title: string;
  entryId: string;
  setId: string;
  rules: readonly Rule[];
  /** Whether this row is the set's first or last one, and whether suggestions hold it there. */
  first: boolean;
  last: boolean;
  holdFirst: boolean;
  holdLast: boolean;
};

const tag =
  "inline-flex min-h-6 shrink-0 items-center gap-1 font-display text-[15px] text-grey-600 whitespace-nowrap";

/** Opener, closer and rules beside a title. A press on a held end frees it; a press on a rule opens the rules. */
export function RowTags(props: RowTagsProps) {
  const { may, openDialog } = usePageTools();
  const tags = ruleTags(props.rules, props.entryId);
  const rules = () => openDialog({ kind: "entry", entryId: props.entryId, topic: "rules" });
  return (
    <>
      {tags.map((words) =>
        may.plan ? (
          <button
            key={words}
            type="button"
            className={`${tag} hover:underline`}
            onClick={rules}
            aria-label={`${words}: rules for ${props.title}`}
          >
            {words}
          </button>
        ) : (
          <span key={words} className={tag}>
            {words}
          </span>
        ),
      )}
      {props.first ? (
        <HoldTag end="first" held={props.holdFirst} setId={props.setId} title={props.title} />
      ) : null}
      {props.last ? (
        <HoldTag end="last" held={props.holdLast} setId={props.setId} title={props.title} />
      ) : null}
    </>
  );
}

function HoldTag({
  end,
  held,
  setId,
  title,
}: {
  end: "first" | "last";
  held: boolean;
  setId: string;
  title: string;
}) {
  const { may, edit } = usePageTools();
  const Icon = held ? Lock : LockOpen;
  if (!may.plan) return held ? <span className={tag}>held</span> : null;
  const field = end === "first" ? "holdFirst" : "holdLast";
  return (
    <button
      type="button"
      className={`${tag} group/hold hover:text-ink`}
      aria-pressed={held}
      title={
        held
          ? `Less retuning keeps this song ${end}. Press to free it.`
          : `Free to move. Press to hold it ${end}.`
      }
      onClick={() =>
        edit(
          [{ kind: "set.set", setId, field, value: !held }],
          held ? `Free the ${end} song` : `Hold the ${end} song`,
        )
      }
    >
      <Icon size={12} aria-hidden="true" />
      {held ? "held" : "free"}
      <span className="sr-only">
        {" "}
        {end}: {title}
      </span>
    </button>
  );
}
