import type { ReactNode } from "react";
import { Link } from "react-router";
import { Mark } from "#app/components/ui/mark.tsx";

/** A page without the rail, for people who are not in an act: the mark, one heading, one column. */
export function PlainPage({
  title,
  sub,
  children,
}: {
  title: ReactNode;
  sub?: ReactNode;
  children: ReactNode;
}) {
  return (
    <div className="mx-auto flex min-h-dvh max-w-md flex-col gap-8 px-4 py-6 sm:py-12">
      <header>
        <Link to="/" className="inline-flex min-h-11 items-center gap-2.5 font-bold font-display text-2xl">
          <Mark size={32} />
          Stillpeg
        </Link>
      </header>
      <main className="flex flex-col gap-6">
        <div>
          <h1 className="font-bold text-3xl leading-tight">{title}</h1>
          {sub ? <p className="text-grey-600">{sub}</p> : null}
        </div>
        {children}
      </main>
    </div>
  );
}
