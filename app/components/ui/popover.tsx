import { Popover } from "@base-ui/react/popover";
import type { ReactNode } from "react";

type PopoverPopupProps = {
  title: ReactNode;
  children: ReactNode;
  side?: "top" | "bottom" | "left" | "right";
};

/** The surface of a popover, beside what opened it. Stands inside a Popover.Root. */
export function PopoverPopup({ title, children, side = "bottom" }: PopoverPopupProps) {
  return (
    <Popover.Portal>
      <Popover.Positioner className="z-50" side={side} sideOffset={6} align="start" collisionPadding={8}>
        <Popover.Popup className="max-h-[min(var(--available-height),34rem)] w-max max-w-[min(26rem,calc(100vw-16px))] overflow-y-auto rounded-sm border border-ink bg-white p-4 text-ink outline-none">
          <Popover.Title className="mb-2 font-display font-semibold text-lg leading-tight">
            {title}
          </Popover.Title>
          {children}
        </Popover.Popup>
      </Popover.Positioner>
    </Popover.Portal>
  );
}
