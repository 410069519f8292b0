import type { FieldMetadata, FormMetadata } from "@conform-to/react";
import { ChevronDown, ChevronUp, X } from "lucide-react";
import type { ReactNode } from "react";
import { choiceName } from "#app/components/songs/way-words.ts";
import { Button } from "#app/components/ui/button.tsx";
import type { SongFormInput } from "#app/domain/repertoire/song-form.ts";

type WayHeadProps = {
  form: FormMetadata<SongFormInput>;
  list: FieldMetadata<SongFormInput["ways"], SongFormInput>;
  titleId: string;
  index: number;
  count: number;
  /** The tuning's name, where it has one. */
  children: ReactNode;
};

/** The heading of one way to play a song, with the buttons that change its place among the others. */
export function WayHead({ form, list, titleId, index, count, children }: WayHeadProps) {
  const name = choiceName(index);
  return (
    <header className="flex min-h-9 items-center gap-1">
      <h3 id={titleId} className="mr-2 font-semibold text-xl">
        {name}
      </h3>
      <span className="text-grey-600">{children}</span>
      <span className="ml-auto flex">
        {index > 0 ? <Move form={form} list={list} from={index} to={index - 1} /> : null}
        {index < count - 1 ? <Move form={form} list={list} from={index} to={index + 1} /> : null}
        {count > 1 ? (
          <Button
            small
            look="quiet"
            aria-label={`Remove ${name.toLowerCase()}`}
            title="Remove"
            type="submit"
            {...form.remove.getButtonProps({ name: list.name, index })}
          >
            <X size={16} aria-hidden="true" />
          </Button>
        ) : null}
      </span>
    </header>
  );
}

function Move({ form, list, from, to }: Pick<WayHeadProps, "form" | "list"> & { from: number; to: number }) {
  const more = to < from;
  const Chevron = more ? ChevronUp : ChevronDown;
  return (
    <Button
      small
      look="quiet"
      aria-label={`Prefer ${choiceName(from).toLowerCase()} ${more ? "more" : "less"}`}
      title={more ? "Prefer more" : "Prefer less"}
      type="submit"
      {...form.reorder.getButtonProps({ name: list.name, from, to })}
    >
      <Chevron size={18} aria-hidden="true" />
    </Button>
  );
}
