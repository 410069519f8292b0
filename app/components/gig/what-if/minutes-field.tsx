import { TextField } from "#app/components/ui/field.tsx";

type MinutesFieldProps = {
  id: string;
  label: string;
  hint?: string;
  least: number;
  most: number;
  text: string;
  onText: (text: string) => void;
};

/**
 * Whole minutes as typed; null where they are none.
 * @example readMinutes("10", 1, 120) // 10
 */
export function readMinutes(text: string, least: number, most: number): number | null {
  const minutes = Number(text.trim());
  return text.trim() !== "" && Number.isInteger(minutes) && minutes >= least && minutes <= most
    ? minutes
    : null;
}

/** Minutes, typed. What is wrong with them is said below; what was typed stays. */
export function MinutesField({ id, label, hint, least, most, text, onText }: MinutesFieldProps) {
  const wrong = readMinutes(text, least, most) === null;
  return (
    <TextField
      id={id}
      label={label}
      hint={hint}
      inputMode="numeric"
      value={text}
      onChange={(event) => onText(event.currentTarget.value)}
      errors={wrong ? [`Write whole minutes, ${least} to ${most}.`] : undefined}
    />
  );
}
