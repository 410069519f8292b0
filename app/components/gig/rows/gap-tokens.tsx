import type { GapToken } from "#app/domain/gig/gap-words.ts";

/** A peg's turn: the string's number, a triangle for the direction, and the semitones. */
function Turn({
  string,
  direction,
  semitones,
}: {
  string: number;
  direction: "up" | "down";
  semitones: number;
}) {
  return (
    <span className="inline-flex items-baseline gap-px">
      {string}
      <Triangle direction={direction} />
      {semitones}
    </span>
  );
}

/** Drawn by borders: there are hundreds on a page, and each SVG would be a picture of its own for the browser to place. */
function Triangle({ direction }: { direction: "up" | "down" }) {
  return (
    <span
      aria-hidden="true"
      className={`mx-px inline-block size-0 border-x-[5.5px] border-x-transparent forced-color-adjust-none ${direction === "up" ? "border-b-9 border-b-up" : "border-t-9 border-t-down"}`}
    />
  );
}

function counted(count: number, direction: "up" | "down"): string {
  return count > 0 ? `${count} ${direction}` : "";
}

/** What hands do in a gap: on a laptop each string, on a phone how many, in the order in which hands work. */
export function GapTokens({ tokens }: { tokens: GapToken[] }) {
  const strings = tokens.filter((token) => token.kind === "string");
  const first = tokens.findIndex((token) => token.kind === "string");
  const count = (direction: "up" | "down") => strings.filter((token) => token.direction === direction).length;
  const few = [counted(count("down"), "down"), counted(count("up"), "up")].filter(Boolean).join(", ");
  if (tokens.length === 0)
    return (
      <span aria-hidden="true" className="text-grey-600">
        nothing to do
      </span>
    );
  return (
    <span
      className="flex min-w-0 items-baseline gap-x-1.5 overflow-hidden whitespace-nowrap"
      aria-hidden="true"
    >
      {tokens.map((token, index) => {
        const comma =
          tokens[index + 1] && !(token.kind === "string" && tokens[index + 1]?.kind === "string") ? "," : "";
        if (token.kind === "string") {
          return (
            <span key={token.string} className={index === first ? "" : "max-lg:hidden"}>
              <span className="hidden lg:inline">
                <Turn {...token} />
                {comma}
              </span>
              <span className="lg:hidden">
                {few}
                {tokens.slice(first).some((later) => later.kind !== "string") ? "," : ""}
              </span>
            </span>
          );
        }
        const words = token.kind === "swap" ? token.guitar.shortName : token.words;
        return (
          <span
            key={`${token.kind}/${words}`}
            className={token.kind === "tech" ? "text-grey-600" : "shrink-0"}
          >
            {token.kind === "swap" ? <span className="max-lg:hidden">Change to </span> : null}
            {words}
            {comma}
          </span>
        );
      })}
    </span>
  );
}
