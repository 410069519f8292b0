import type { ReactNode } from "react";

/** A page's heading with what belongs to it on the right: its one primary action. */
export function PageHead({
  title,
  sub,
  children,
}: {
  title: ReactNode;
  sub?: ReactNode;
  children?: ReactNode;
}) {
  return (
    <header className="flex flex-wrap items-end justify-between gap-x-6 gap-y-3 border-grey-200 border-b px-4 pt-5 pb-4 md:px-6">
      <div>
        <h1 className="font-bold text-3xl leading-tight">{title}</h1>
        {sub ? <p className="text-grey-600">{sub}</p> : null}
      </div>
      {children ? <div className="flex flex-wrap gap-2">{children}</div> : null}
    </header>
  );
}

/** What stands where there is nothing yet: says so, and offers the next real step. */
export function EmptyState({ title, children }: { title: string; children?: ReactNode }) {
  return (
    <div className="mx-auto flex max-w-md flex-col items-start gap-3 px-4 py-14">
      <h2 className="font-semibold text-xl">{title}</h2>
      <div className="flex flex-col items-start gap-3 text-grey-600">{children}</div>
    </div>
  );
}
