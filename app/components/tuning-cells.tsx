type TuningCellsProps = {
  /** Names of the open strings, low side first, already in the reader's naming. */
  letters: string[];
  /** Per string, low side first: true where it differs from how this guitar was last used. */
  changed?: boolean[];
  /** What a screen reader says instead of the letters. */
  spoken?: string;
};

/** The letters of a tuning in cells of one width, so that the same string stands in the same column on each row. */
export function TuningCells({ letters, changed, spoken }: TuningCellsProps) {
  const cell = letters.length > 8 ? "min-w-4 text-sm" : letters.length > 6 ? "w-6" : "w-7";
  return (
    <span
      className="inline-flex font-display font-semibold tabular"
      role="img"
      aria-label={spoken ?? letters.join(" ")}
    >
      {letters.map((letter, index) => (
        <span
          // biome-ignore lint/suspicious/noArrayIndexKey: a string is known by its place
          key={index}
          aria-hidden="true"
          className={`inline-flex h-7 items-center justify-center ${cell} ${letter.length > 2 ? "text-xs" : ""} ${changed?.[index] ? "bg-ink text-white" : ""}`}
        >
          {letter}
        </span>
      ))}
    </span>
  );
}
