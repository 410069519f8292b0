import { Tooltip } from "@base-ui/react/tooltip";
import { createContext, type ReactNode, use, useEffect, useState, useSyncExternalStore } from "react";

/** What is pointed at: its key (for a gap the entry it leads into), the sentence that tells it, and where. */
export type Pointed = { key: string; sentence: string; anchor: Element };

type PointedStore = {
  current: () => Pointed | null;
  subscribe: (changed: () => void) => () => void;
  show: (pointed: Pointed) => void;
  hide: (key: string) => void;
};

/** A store rather than state, so that pointing at one gap draws that gap again and no other row. */
function pointedStore(): PointedStore {
  let pointed: Pointed | null = null;
  const listeners = new Set<() => void>();
  const put = (next: Pointed | null) => {
    pointed = next;
    for (const listener of listeners) listener();
  };
  return {
    current: () => pointed,
    subscribe: (changed) => {
      listeners.add(changed);
      return () => listeners.delete(changed);
    },
    show: put,
    hide: (key) => {
      if (pointed?.key === key) put(null);
    },
  };
}

const StoreContext = createContext<PointedStore>(pointedStore());

/** To show and hide what is pointed at. */
export function usePointAt(): Pick<PointedStore, "show" | "hide"> {
  return use(StoreContext);
}

/** The key of what is pointed at now, in the list or in a ribbon; null for nothing. */
export function usePointedKey(): string | null {
  const store = use(StoreContext);
  return useSyncExternalStore(
    store.subscribe,
    () => store.current()?.key ?? null,
    () => null,
  );
}

/** Whether this is what is pointed at. */
export function useIsPointed(key: string): boolean {
  const store = use(StoreContext);
  return useSyncExternalStore(
    store.subscribe,
    () => store.current()?.key === key,
    () => false,
  );
}

/** What an element needs so that hover, focus and tap say its sentence. */
export function usePointer(key: string, sentence: string) {
  const { show, hide } = usePointAt();
  const point = (anchor: Element) => show({ key, sentence, anchor });
  return {
    onPointerEnter: (event: React.PointerEvent) => {
      if (event.pointerType === "mouse") point(event.currentTarget);
    },
    onPointerLeave: (event: React.PointerEvent) => {
      if (event.pointerType === "mouse") hide(key);
    },
    onFocus: (event: React.FocusEvent) => point(event.currentTarget),
    onBlur: () => hide(key),
    onClick: (event: React.MouseEvent) => point(event.currentTarget),
  };
}

/** Ties list and ribbons together: whichever of them is pointed at, both show it, and one bubble says it. */
export function GapFocus({ children }: { children: ReactNode }) {
  const [store] = useState(pointedStore);
  return (
    <StoreContext value={store}>
      {children}
      <Bubble />
    </StoreContext>
  );
}

/** How long one points before the bubble opens, so that it does not flicker after a pointer that only passes. */
const openAfterMilliseconds = 200;

function Bubble() {
  const store = use(StoreContext);
  const pointed = useSyncExternalStore(store.subscribe, store.current, () => null);
  const [open, setOpen] = useState(false);
  useEffect(() => {
    if (!pointed) {
      setOpen(false);
      return;
    }
    const timer = setTimeout(() => setOpen(true), openAfterMilliseconds);
    return () => clearTimeout(timer);
  }, [pointed]);
  return (
    <Tooltip.Root
      open={open && pointed !== null}
      onOpenChange={(next) => (next || !pointed ? null : store.hide(pointed.key))}
    >
      <Tooltip.Portal>
        <Tooltip.Positioner
          anchor={pointed?.anchor}
          side="bottom"
          align="start"
          alignOffset={12}
          sideOffset={4}
          collisionPadding={8}
          className="pointer-events-none z-40"
        >
          <Tooltip.Popup className="max-w-[min(26rem,92vw)] rounded-sm bg-ink px-3 py-2 text-base text-white">
            {pointed?.sentence}
          </Tooltip.Popup>
        </Tooltip.Positioner>
      </Tooltip.Portal>
    </Tooltip.Root>
  );
}
