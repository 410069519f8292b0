import { Menu } from "@base-ui/react/menu";
import { type EntryPayload, usePageTools } from "#app/components/gig/desk/page-context.tsx";
import { type Part, placeBeside, placeOf, toPart } from "#app/components/gig/sets/moves.ts";
import { MenuItem, MenuLine, MenuLink, MenuPopup } from "#app/components/ui/menu.tsx";
import type { Entry, Gig } from "#app/domain/gig/gig.ts";
import { setsOf } from "#app/domain/gig/order.ts";

type RowMenuProps = { gig: Gig; parts: Part[]; titleOf: (entryId: string) => string };

/** Everything that can be done with one row, without dragging. One menu for all rows. */
export function RowMenu({ gig, parts, titleOf }: RowMenuProps) {
  const { rowMenu } = usePageTools();
  return (
    <Menu.Root handle={rowMenu}>
      {({ payload }: { payload: EntryPayload | undefined }) => {
        const entry = gig.entries.find((candidate) => candidate.id === payload?.entryId);
        return (
          <MenuPopup>
            {entry ? <RowMenuItems entry={entry} gig={gig} parts={parts} title={titleOf(entry.id)} /> : null}
          </MenuPopup>
        );
      }}
    </Menu.Root>
  );
}

type RowMenuItemsProps = { entry: Entry; gig: Gig; parts: Part[]; title: string };

function RowMenuItems({ entry, gig, parts, title }: RowMenuItemsProps) {
  const { may, openDialog, remove } = usePageTools();
  return (
    <>
      {may.plan ? (
        <>
          <MoveItems entry={entry} parts={parts} />
          <ElsewhereItems entry={entry} gig={gig} parts={parts} />
          <MenuLine />
        </>
      ) : null}
      {may.prepare ? <PinItems entry={entry} title={title} /> : null}
      {may.plan ? (
        <>
          <MenuItem onClick={() => openDialog({ kind: "entry", entryId: entry.id, topic: "rules" })}>
            Rules
          </MenuItem>
          <MenuItem onClick={() => openDialog({ kind: "entry", entryId: entry.id, topic: "cover" })}>
            Talk before it
          </MenuItem>
        </>
      ) : null}
      {may.prepare ? (
        <MenuItem onClick={() => openDialog({ kind: "entry", entryId: entry.id, topic: "note" })}>
          Note for the tech
        </MenuItem>
      ) : null}
      <MenuLink href={`/songs/${entry.songId}`}>Open the song</MenuLink>
      {may.plan ? (
        <>
          <MenuLine />
          <MenuItem onClick={() => remove(entry.id)}>Remove from the set</MenuItem>
        </>
      ) : null}
    </>
  );
}

function MoveItems({ entry, parts }: { entry: Entry; parts: Part[] }) {
  const { move, step } = usePageTools();
  const part = parts.find((candidate) => candidate.entryIds.includes(entry.id));
  const place = placeOf(parts, entry.id);
  if (!part || !place) return null;
  const last = part.entryIds.length - 1;
  return (
    <>
      <MenuItem
        disabled={!placeBeside(parts, entry.id, -1)}
        closeOnClick={false}
        onClick={() => step(entry.id, -1)}
      >
        Move up
      </MenuItem>
      <MenuItem
        disabled={!placeBeside(parts, entry.id, 1)}
        closeOnClick={false}
        onClick={() => step(entry.id, 1)}
      >
        Move down
      </MenuItem>
      <MenuItem disabled={place.index === 0} onClick={() => move(entry.id, { ...place, index: 0 })}>
        Move to the start
      </MenuItem>
      <MenuItem disabled={place.index === last} onClick={() => move(entry.id, { ...place, index: last })}>
        Move to the end
      </MenuItem>
    </>
  );
}

function ElsewhereItems({ entry, gig, parts }: { entry: Entry; gig: Gig; parts: Part[] }) {
  const { move } = usePageTools();
  const targets = setsOf(gig).flatMap((set) =>
    ([0, 1] as const)
      .filter((section) => set.id !== entry.setId || section !== entry.section)
      .map((section) => ({ setId: set.id, setName: set.name, section })),
  );
  return targets.map((target) => {
    const there = parts.find((part) => part.setId === target.setId && part.section === target.section);
    return (
      <MenuItem
        key={`${target.setId}/${target.section}`}
        onClick={() => move(entry.id, { ...target, index: there?.entryIds.length ?? 0 })}
      >
        Move to {toPart(target, gig.sets.length)}
      </MenuItem>
    );
  });
}

function PinItems({ entry, title }: { entry: Entry; title: string }) {
  const { chooser, edit } = usePageTools();
  const pinned = entry.pinned !== "none";
  return (
    <>
      <MenuItem onClick={() => chooser.open(chooserTriggerId(entry.id))}>Choose guitar and tuning</MenuItem>
      <MenuItem
        disabled={!pinned && !entry.guitarId}
        onClick={() =>
          edit(
            [{ kind: "entry.set", entryId: entry.id, field: "pinned", value: pinned ? "none" : "both" }],
            pinned ? `Unpin ${title}` : `Pin ${title}`,
          )
        }
      >
        {pinned ? "Unpin guitar and tuning" : "Pin guitar and tuning"}
      </MenuItem>
      <MenuLine />
    </>
  );
}

/** The id of the button that opens the chooser for an entry. */
export function chooserTriggerId(entryId: string): string {
  return `choose-${entryId}`;
}

export function menuTriggerId(entryId: string): string {
  return `menu-${entryId}`;
}
