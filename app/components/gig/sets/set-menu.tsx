import { Menu } from "@base-ui/react/menu";
import { Ellipsis } from "lucide-react";
import { memo } from "react";
import { usePageTools } from "#app/components/gig/desk/page-context.tsx";
import { MenuCheck, MenuItem, MenuLine, MenuPopup } from "#app/components/ui/menu.tsx";
import type { Edit } from "#app/domain/gig/edit.ts";
import type { Gig, GigSet } from "#app/domain/gig/gig.ts";
import { entriesOf } from "#app/domain/gig/order.ts";

type SetMenuProps = { set: GigSet; gig: Gig; hasEncore: boolean };

/** What can be done with a whole set. */
export const SetMenu = memo(function SetMenu({ set, gig, hasEncore }: SetMenuProps) {
  const { edit, openDialog, showEncore } = usePageTools();
  const remove = () => {
    const songs: Edit[] = entriesOf(gig, set.id).map((entry) => ({
      kind: "entry.remove",
      entryId: entry.id,
    }));
    edit([...songs, { kind: "set.remove", setId: set.id }], `Remove ${set.name}`);
  };
  return (
    <Menu.Root>
      <Menu.Trigger
        aria-label={`${set.name}: more`}
        className="inline-flex size-11 items-center justify-center rounded-sm hover:bg-grey-100 lg:size-8"
      >
        <Ellipsis size={18} aria-hidden="true" />
      </Menu.Trigger>
      <MenuPopup align="start">
        <MenuItem onClick={() => openDialog({ kind: "set", setId: set.id })}>Name and interval</MenuItem>
        <MenuItem onClick={() => openDialog({ kind: "paste", setId: set.id })}>
          Paste a list of songs
        </MenuItem>
        <MenuItem onClick={() => openDialog({ kind: "wishes" })}>Wishes for the order</MenuItem>
        {hasEncore ? null : <MenuItem onClick={() => showEncore(set.id)}>Add an encore</MenuItem>}
        <MenuLine />
        <MenuCheck
          checked={set.holdFirst}
          onCheckedChange={(held: boolean) =>
            edit(
              [{ kind: "set.set", setId: set.id, field: "holdFirst", value: held }],
              `${held ? "Hold" : "Free"} the first song`,
            )
          }
        >
          Hold the first song
        </MenuCheck>
        <MenuCheck
          checked={set.holdLast}
          onCheckedChange={(held: boolean) =>
            edit(
              [{ kind: "set.set", setId: set.id, field: "holdLast", value: held }],
              `${held ? "Hold" : "Free"} the last song`,
            )
          }
        >
          Hold the last song
        </MenuCheck>
        {gig.sets.length > 1 ? (
          <>
            <MenuLine />
            <MenuItem onClick={remove}>Remove {set.name}</MenuItem>
          </>
        ) : null}
      </MenuPopup>
    </Menu.Root>
  );
});
