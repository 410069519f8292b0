import { Warning } from "#app/components/ui/warning.tsx";

/** What is wrong with a form as a whole, read out when it appears. */
export function FormErrors({ id, errors }: { id?: string; errors: readonly string[] | undefined }) {
  if (!errors?.length) return null;
  return (
    <div id={id} role="alert" className="border-warning border-l-2 pl-3">
      {errors.map((error) => (
        <Warning key={error} className="text-base">
          {error}
        </Warning>
      ))}
    </div>
  );
}
