import { Menu } from "@base-ui/react/menu";
import { memo } from "react";
import { buttonClass } from "#app/components/ui/button.tsx";
import { MenuLink, MenuPopup } from "#app/components/ui/menu.tsx";

type SheetsMenuProps = { gigId: string; paper: "a4" | "letter"; pending: number; className?: string };

const papers = [
  { paper: "a4", name: "A4" },
  { paper: "letter", name: "Letter" },
] as const;

/** What can be printed of a gig. Without JavaScript it is a link to the stage sheet. */
export const SheetsMenu = memo(function SheetsMenu(props: SheetsMenuProps) {
  const { gigId, paper, pending, className = "" } = props;
  const address = `/gigs/${gigId}/stage-sheet.pdf`;
  const sorted = papers.toSorted((a, b) => Number(b.paper === paper) - Number(a.paper === paper));
  return (
    <Menu.Root>
      <Menu.Trigger
        nativeButton={false}
        render={<a href={address}>Sheets</a>}
        onClick={(event) => event.preventDefault()}
        className={`${buttonClass("primary")} ${className}`}
      />
      <MenuPopup>
        {sorted.map(({ paper: size, name }) => (
          <MenuLink key={size} href={`${address}?paper=${size}`} target="_blank" rel="noreferrer">
            Stage sheet, {name}
          </MenuLink>
        ))}
        {pending > 0 ? (
          <p className="max-w-60 px-3 py-1.5 text-grey-600 text-sm">
            {pending === 1 ? "1 edit is" : `${pending} edits are`} not on the sheet yet: the server has not
            got
            {pending === 1 ? " it" : " them"}.
          </p>
        ) : null}
      </MenuPopup>
    </Menu.Root>
  );
});
