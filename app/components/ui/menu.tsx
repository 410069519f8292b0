import { Menu } from "@base-ui/react/menu";
import type { ComponentProps, ReactNode } from "react";

const item =
  "flex min-h-11 cursor-default select-none items-center gap-2.5 px-3 font-display font-medium text-base outline-none data-[disabled]:text-grey-600 data-[highlighted]:bg-grey-100 md:min-h-8";

/** The surface of a menu, beside what opened it. Stands inside a Menu.Root. */
export function MenuPopup({
  children,
  align = "end",
}: {
  children: ReactNode;
  align?: "start" | "center" | "end";
}) {
  return (
    <Menu.Portal>
      <Menu.Positioner className="z-50" sideOffset={4} align={align} collisionPadding={8}>
        <Menu.Popup className="max-h-[var(--available-height)] min-w-52 max-w-80 overflow-y-auto rounded-sm border border-ink bg-white py-1 text-ink outline-none">
          {children}
        </Menu.Popup>
      </Menu.Positioner>
    </Menu.Portal>
  );
}

/** One thing to do. */
export function MenuItem({ className = "", ...rest }: ComponentProps<typeof Menu.Item>) {
  return <Menu.Item className={`${item} ${className}`} {...rest} />;
}

/** A link in a menu: another page, or a file. */
export function MenuLink({ className = "", ...rest }: ComponentProps<typeof Menu.LinkItem>) {
  return <Menu.LinkItem className={`${item} ${className}`} closeOnClick {...rest} />;
}

/** Something that is on or off. */
export function MenuCheck({ children, ...rest }: ComponentProps<typeof Menu.CheckboxItem>) {
  return (
    <Menu.CheckboxItem className={item} {...rest}>
      <span className="inline-flex size-4 shrink-0 items-center justify-center border border-ink">
        <Menu.CheckboxItemIndicator>
          <svg width="12" height="12" viewBox="0 0 12 12" aria-hidden="true">
            <path d="M2 6.500l2.800 2.800L10 3.500" fill="none" stroke="currentColor" strokeWidth="2" />
          </svg>
        </Menu.CheckboxItemIndicator>
      </span>
      {children}
    </Menu.CheckboxItem>
  );
}

/** A hairline between groups. */
export function MenuLine() {
  return <Menu.Separator className="my-1 h-px bg-grey-200" />;
}
