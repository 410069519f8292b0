import { Dialog as BaseDialog } from "@base-ui/react/dialog";
import type { ReactNode } from "react";
import { buttonClass } from "#app/components/ui/button.tsx";

type DialogProps = {
  open: boolean;
  /** `reason` is "close-press" where the close button was pressed, "escape-key" or "outside-press" otherwise. */
  onOpenChange: (open: boolean, details: { reason: string }) => void;
  title: string;
  children: ReactNode;
  /** Shown before the close button, at the bottom. */
  actions?: ReactNode;
  closeLabel?: string;
  /** For what stands in two columns. */
  wide?: boolean;
};

/** A modal dialog; on a phone it fills the width and stands at the bottom. */
export function Dialog({
  open,
  onOpenChange,
  title,
  children,
  actions,
  closeLabel = "Close",
  wide = false,
}: DialogProps) {
  return (
    <BaseDialog.Root open={open} onOpenChange={onOpenChange}>
      <BaseDialog.Portal>
        <BaseDialog.Backdrop className="fixed inset-0 z-40 bg-ink/50" />
        <BaseDialog.Popup
          className={`fixed inset-x-0 bottom-0 z-50 flex max-h-[90dvh] flex-col gap-4 overflow-y-auto rounded-sm bg-white p-5 sm:inset-x-auto sm:bottom-auto sm:top-1/2 sm:left-1/2 sm:-translate-x-1/2 sm:-translate-y-1/2 ${wide ? "sm:w-[min(72rem,94vw)]" : "sm:w-[min(36rem,92vw)]"}`}
        >
          <BaseDialog.Title className="font-bold font-display text-2xl">{title}</BaseDialog.Title>
          <div className="flex flex-col gap-4">{children}</div>
          <div className="-mx-5 -mb-5 sticky -bottom-5 flex flex-wrap justify-end gap-2 border-grey-200 border-t bg-white px-5 py-4">
            {actions}
            <BaseDialog.Close className={buttonClass("plain")}>{closeLabel}</BaseDialog.Close>
          </div>
        </BaseDialog.Popup>
      </BaseDialog.Portal>
    </BaseDialog.Root>
  );
}
