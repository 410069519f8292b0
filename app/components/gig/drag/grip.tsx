import {
  DndContext,
  type DragStartEvent,
  KeyboardCode,
  KeyboardSensor,
  PointerSensor,
  useDraggable,
  useSensor,
  useSensors,
} from "@dnd-kit/core";
import {
  createContext,
  type KeyboardEvent,
  memo,
  type PointerEvent,
  type ReactNode,
  type RefObject,
  use,
  useId,
  useLayoutEffect,
  useMemo,
  useRef,
} from "react";
import { dragInstructions } from "#app/components/gig/drag/drag-words.ts";

/** What a drag does with the gig. `press` is what began it. */
export type DragHandlers = {
  start: (entryId: string, press: Event) => void;
  /** One place up or down, by keyboard. */
  step: (by: -1 | 1) => void;
  end: () => void;
  cancel: () => void;
};

type Press = PointerEvent<HTMLElement> | KeyboardEvent<HTMLElement>;

/** What a row's number does when it is pressed. The same for all rows, and for as long as the page is open. */
type Grip = { press: (event: Press, entryId: string) => void; instructionsId: string };

const GripContext = createContext<Grip | null>(null);

export function useGrip(): Grip {
  const grip = use(GripContext);
  if (!grip) throw new Error("A row's number stands outside the list that can be dragged");
  return grip;
}

type RowGripsProps = { handlers: DragHandlers; children: ReactNode };

/**
 * Lets the rows below it be dragged. dnd-kit's contexts change at each move of the pointer, and React looks through all
 * that stands below a context which changes: so they stand beside the rows, not above them, and one grip serves all.
 */
export function RowGrips({ handlers, children }: RowGripsProps) {
  const press = useRef<Grip["press"]>(() => undefined);
  const latest = useRef(handlers);
  useLayoutEffect(() => {
    latest.current = handlers;
  });
  const instructionsId = useId();
  const grip = useMemo(
    (): Grip => ({ press: (event, entryId) => press.current(event, entryId), instructionsId }),
    [instructionsId],
  );
  return (
    <GripContext value={grip}>
      {children}
      <DragListener press={press} latest={latest} />
      <p id={instructionsId} hidden>
        {dragInstructions}
      </p>
    </GripContext>
  );
}

/** Silences dnd-kit's own announcements: what happens is said in our words elsewhere. */
const unsaid = {
  onDragStart: () => undefined,
  onDragOver: () => undefined,
  onDragEnd: () => undefined,
  onDragCancel: () => undefined,
};
const accessibility = {
  announcements: unsaid,
  screenReaderInstructions: { draggable: "" },
  restoreFocus: false,
};

/** dnd-kit need not know where the row stands, and asking would lay the page out in the middle of a change. */
const nowhere = { top: 0, right: 0, bottom: 0, left: 0, width: 0, height: 0 };
const measuring = { draggable: { measure: () => nowhere } };

/** Where the row would go is worked out elsewhere. */
const noCollisions = () => [];

const pointerOptions = { activationConstraint: { distance: 4 } };

type DragListenerProps = { press: RefObject<Grip["press"]>; latest: RefObject<DragHandlers> };

const DragListener = memo(function DragListener({ press, latest }: DragListenerProps) {
  const held = useRef("");
  const keyboardOptions = useMemo(
    () => ({
      coordinateGetter: (event: globalThis.KeyboardEvent) => {
        const by = event.code === KeyboardCode.Down ? 1 : event.code === KeyboardCode.Up ? -1 : 0;
        if (by === 0) return undefined;
        event.preventDefault();
        latest.current.step(by);
        return undefined;
      },
    }),
    [latest],
  );
  const sensors = useSensors(
    useSensor(PointerSensor, pointerOptions),
    useSensor(KeyboardSensor, keyboardOptions),
  );
  return (
    <DndContext
      id={useId()}
      sensors={sensors}
      accessibility={accessibility}
      measuring={measuring}
      collisionDetection={noCollisions}
      onDragStart={({ activatorEvent }: DragStartEvent) => latest.current.start(held.current, activatorEvent)}
      onDragEnd={() => latest.current.end()}
      onDragCancel={() => latest.current.cancel()}
    >
      <Hand press={press} held={held} />
    </DndContext>
  );
});

/** The one thing that dnd-kit knows can be dragged; whichever row is pressed, it stands in for that row. */
function Hand({ press, held }: { press: RefObject<Grip["press"]>; held: RefObject<string> }) {
  const { active, listeners, setNodeRef, setActivatorNodeRef } = useDraggable({ id: "row" });
  useLayoutEffect(() => {
    press.current = (event, entryId) => {
      if (active) return;
      held.current = entryId;
      setNodeRef(event.currentTarget.closest<HTMLElement>("[data-entry]"));
      setActivatorNodeRef(event.currentTarget);
      listeners?.[event.type === "keydown" ? "onKeyDown" : "onPointerDown"]?.(event);
    };
  });
  return null;
}
