/** What is done otherwise, one line each: so many stand there at once, the rest is asked for. */
export function ChangeList({ changes, atOnce }: { changes: readonly string[]; atOnce: number }) {
  if (changes.length === 0) return null;
  const more = changes.slice(atOnce);
  return (
    <div className="text-grey-800 text-sm leading-snug">
      <Lines lines={changes.slice(0, atOnce)} />
      {more.length > 0 ? (
        <details className="pt-0.5">
          <summary className="w-fit underline underline-offset-2 max-lg:py-2">
            {more.length === 1 ? "1 more change" : `${more.length} more changes`}
          </summary>
          <div className="pt-0.5">
            <Lines lines={more} />
          </div>
        </details>
      ) : null}
    </div>
  );
}

function Lines({ lines }: { lines: readonly string[] }) {
  return (
    <ul className="flex flex-col gap-0.5">
      {lines.map((words) => (
        <li key={words} className="pl-3 -indent-3">
          {words}
        </li>
      ))}
    </ul>
  );
}
