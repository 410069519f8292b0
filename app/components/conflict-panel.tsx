import { ButtonLink } from "#app/components/ui/button.tsx";
import { Octagon } from "#app/components/ui/warning.tsx";
import type { Difference } from "#app/domain/repertoire/form-differences.ts";

type ConflictPanelProps = {
  /** What was saved meanwhile, as it is called: "song". */
  what: string;
  differences: readonly Difference[];
  /** True where somebody deleted it: saving again puts it back. */
  deleted: boolean;
  /** The page as it is now saved, without what was typed. */
  savedUrl: string;
};

/**
 * Somebody else saved in between: shows both states side by side. Nothing was written; the form below it still holds
 * what was typed, and saving it again writes it over what is shown here.
 */
export function ConflictPanel({ what, differences, deleted, savedUrl }: ConflictPanelProps) {
  return (
    <section
      aria-labelledby="conflict-title"
      className="mx-4 mt-5 flex flex-col gap-3 rounded-sm border-2 border-warning bg-white p-4 md:mx-6"
    >
      <h2 id="conflict-title" className="flex items-center gap-2 font-semibold text-lg">
        <Octagon size={18} />
        {`Somebody else ${deleted ? "deleted" : "saved"} this ${what} while you were writing`}
      </h2>
      {differences.length > 0 ? (
        <table className="w-full max-w-3xl border-collapse text-left text-sm">
          <thead>
            <tr className="border-grey-200 border-b text-grey-600">
              <th scope="col" className="py-1 pr-4 font-medium">
                Field
              </th>
              <th scope="col" className="py-1 pr-4 font-medium">
                Saved now
              </th>
              <th scope="col" className="py-1 font-medium">
                Yours
              </th>
            </tr>
          </thead>
          <tbody>
            {differences.map(({ label, saved, typed }) => (
              <tr key={label} className="border-grey-200 border-b align-top">
                <th scope="row" className="py-1.5 pr-4 font-medium">
                  {label}
                </th>
                <td className="whitespace-pre-line py-1.5 pr-4">{saved || "nothing"}</td>
                <td className="whitespace-pre-line py-1.5">{typed || "nothing"}</td>
              </tr>
            ))}
          </tbody>
        </table>
      ) : (
        <p className="text-sm">What they saved reads the same as yours.</p>
      )}
      <div className="flex flex-wrap items-center gap-3">
        <p className="text-sm">
          {deleted
            ? "Nothing of yours is saved yet. Save to put it back as you typed it, or"
            : "Nothing of yours is saved yet. Save to keep yours, or"}
        </p>
        <ButtonLink small to={savedUrl} reloadDocument>
          {deleted ? "Leave it deleted" : "Take theirs"}
        </ButtonLink>
      </div>
    </section>
  );
}
