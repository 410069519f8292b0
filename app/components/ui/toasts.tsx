import { Toast } from "@base-ui/react/toast";
import type { ReactNode } from "react";
import { buttonClass } from "#app/components/ui/button.tsx";

/** Gives the page short notes that leave by themselves; `useToasts().add({ title, actionProps })` shows one. */
export function Toasts({ children }: { children: ReactNode }) {
  return (
    <Toast.Provider limit={3} timeout={6000}>
      {children}
      <Toast.Portal>
        <Toast.Viewport className="fixed right-4 bottom-24 left-4 z-50 mx-auto flex flex-col gap-2 sm:left-auto sm:w-96 lg:bottom-4">
          <ToastList />
        </Toast.Viewport>
      </Toast.Portal>
    </Toast.Provider>
  );
}

export const useToasts = Toast.useToastManager;

function ToastList() {
  const { toasts } = Toast.useToastManager();
  return toasts.map((toast) => (
    <Toast.Root
      key={toast.id}
      toast={toast}
      className="rounded-sm border border-ink bg-ink text-white data-[limited]:hidden"
      swipeDirection={["down", "right"]}
    >
      <Toast.Content className="flex items-center gap-3 py-1.5 pr-1.5 pl-4">
        <Toast.Title className="min-w-0 flex-1 text-base" />
        <Toast.Action className={buttonClass("plain", true)} />
        <Toast.Close
          aria-label="Put this note away"
          className="inline-flex size-11 items-center justify-center focus-visible:outline-white"
        >
          <svg width="14" height="14" viewBox="0 0 14 14" aria-hidden="true">
            <path d="M2 2l10 10M12 2L2 12" stroke="currentColor" strokeWidth="2" />
          </svg>
        </Toast.Close>
      </Toast.Content>
    </Toast.Root>
  ));
}
