import type { ReactNode } from "react";
import { PostButton } from "#app/components/post-button.tsx";

/** Says what was just done, with the way back beside it. Stands in the page, so it is there after a reload too. */
export function UndoBar({ children, undo }: { children: ReactNode; undo?: string }) {
  return (
    <div
      role="status"
      className="flex min-h-12 flex-wrap items-center gap-x-4 gap-y-1 border-grey-200 border-b bg-grey-100 px-4 py-1.5 md:px-6"
    >
      <p>{children}</p>
      {undo ? (
        <PostButton small action={undo}>
          Undo
        </PostButton>
      ) : null}
    </div>
  );
}
