const strings = [
  { weight: 3.4, path: "M280 0V170L271 188V348" },
  { weight: 2.8, path: "M302 0V266L293 284V348" },
  { weight: 2.3, path: "M324 0V348" },
  { weight: 1.8, path: "M346 0V348" },
  { weight: 1.4, path: "M368 0V348" },
  { weight: 1.1, path: "M390 0V266L381 284V348" },
];

const songs = [
  { y: 0, title: "Harrow Weather", letters: "EADGBE", turned: [] },
  { y: 96, title: "Copper in the Ditch", letters: "EADGBE", turned: [] },
  { y: 192, title: "The Ropewalk", letters: "DADGBE", turned: [0] },
  { y: 288, title: "Moth at the Pane", letters: "DGDGBD", turned: [1, 5] },
];

const gaps = [
  { y: 60, words: "Capo on 2", time: "covered" },
  { y: 156, words: "6 down 2", time: "3 s" },
  { y: 252, words: "Capo off, 5 and 1 down 2", time: "16 s" },
];

const turns = [
  { x: 271, y: 179 },
  { x: 293, y: 275 },
  { x: 381, y: 275 },
];

/** Four songs of a set and one guitar's ribbon beside them: what Stillpeg shows, in small. */
export function SmallRibbon() {
  return (
    <figure className="flex flex-col gap-3">
      <svg
        viewBox="0 0 420 348"
        className="h-auto w-full font-display"
        role="img"
        aria-labelledby="small-ribbon"
      >
        <title id="small-ribbon">
          Four songs in order, with the strings of a guitar running down beside them. Strings that are retuned
          between two songs step aside there; a capo lies across the strings for two songs.
        </title>
        <rect width="252" height="348" fill="var(--color-white)" />
        {gaps.map((gap) => (
          <g key={gap.y} fontSize="14">
            <rect y={gap.y} width="252" height="36" fill="var(--color-ground)" />
            <path d={`M0 ${gap.y}h252M0 ${gap.y + 36}h252`} stroke="var(--color-grey-200)" />
            <text x="12" y={gap.y + 23} fontWeight="600" fill="var(--color-ink)">
              {gap.words}
            </text>
            <text x="240" y={gap.y + 23} textAnchor="end" fontWeight="600" fill="var(--color-ink)">
              {gap.time}
            </text>
          </g>
        ))}
        {songs.map((song) => (
          <g key={song.y}>
            <text x="12" y={song.y + 26} fontSize="19" fontWeight="600" fill="var(--color-ink)">
              {song.title}
            </text>
            {[...song.letters].map((letter, string) => {
              const turned = song.turned.some((other) => other === string);
              const x = 12 + 20 * string;
              return (
                <g key={`${song.y}-${x}`} fontSize="15" fontWeight="600" textAnchor="middle">
                  {turned ? (
                    <rect x={x} y={song.y + 33} width="18" height="20" fill="var(--color-ink)" />
                  ) : null}
                  <text x={x + 9} y={song.y + 48} fill={turned ? "var(--color-white)" : "var(--color-ink)"}>
                    {letter}
                  </text>
                </g>
              );
            })}
          </g>
        ))}
        <g fill="none" stroke="var(--color-ink)">
          {strings.map((string) => (
            <path key={string.path} d={string.path} strokeWidth={string.weight} />
          ))}
        </g>
        <g fill="var(--color-down)" fontSize="14" fontWeight="700">
          {turns.map((turn) => (
            <g key={turn.x}>
              <path d={`M${turn.x + 9} ${turn.y - 4}h9l-4.500 8z`} />
              <text
                x={turn.x + 20}
                y={turn.y + 5}
                stroke="var(--color-ground)"
                strokeWidth="3"
                paintOrder="stroke"
              >
                2
              </text>
            </g>
          ))}
        </g>
        <path d="M263 117V243H404V117" fill="none" stroke="var(--color-brass)" strokeWidth="2.500" />
        <rect x="261" y="114" width="145" height="22" rx="3" fill="var(--color-brass)" />
        <text x="333" y="131" fontSize="16" fontWeight="700" textAnchor="middle" fill="var(--color-white)">
          2
        </text>
      </svg>
      <figcaption className="text-grey-600">
        One guitar through four songs. At the right of each gap: dead air, the seconds that the talk does not
        cover.
      </figcaption>
    </figure>
  );
}
