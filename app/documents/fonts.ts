import { createRequire } from "node:module";
import { Font } from "@react-pdf/renderer";
import * as fontkit from "fontkit";

export type Weight = 500 | 600 | 700;

const require = createRequire(import.meta.url);

/**
 * The faces of every sheet, first choice first: Barlow Condensed has no ♯ ♭, and its latin subset no Ł or ź. The
 * renderer reads .woff, not .woff2.
 */
const faces = [
  {
    family: "Barlow Condensed",
    file: (weight: Weight) =>
      `@fontsource/barlow-condensed/files/barlow-condensed-latin-${weight}-normal.woff`,
  },
  {
    family: "Barlow Condensed Ext",
    file: (weight: Weight) =>
      `@fontsource/barlow-condensed/files/barlow-condensed-latin-ext-${weight}-normal.woff`,
  },
  {
    family: "Noto Sans Math",
    file: () => "@fontsource/noto-sans-math/files/noto-sans-math-latin-400-normal.woff",
  },
];

/** The font list that every text of a sheet is set in. */
export const families = faces.map((face) => face.family);

const weights: Weight[] = [500, 600, 700];
let registered = false;

/** Makes the faces known to the renderer, once a process. Words are never broken at a hyphen of the renderer's own. */
export function registerFonts(): void {
  if (registered) return;
  for (const face of faces) {
    Font.register({
      family: face.family,
      fonts: weights.map((weight) => ({ src: require.resolve(face.file(weight)), fontWeight: weight })),
    });
  }
  Font.registerHyphenationCallback((word) => [word]);
  registered = true;
}

const opened = new Map<string, fontkit.Font>();

function open(file: string): fontkit.Font {
  const path = require.resolve(file);
  const known = opened.get(path);
  if (known) return known;
  const font = fontkit.openSync(path);
  if (!("layout" in font)) throw new Error(`${file} is a collection, not a font`);
  opened.set(path, font);
  return font;
}

/** The parts of a text that one face can set, in order. A character that none has goes to the first face. */
function runs(text: string, weight: Weight): { font: fontkit.Font; text: string }[] {
  const fonts = faces.map((face) => open(face.file(weight)));
  const found: { font: fontkit.Font; text: string }[] = [];
  for (const character of text) {
    const font = fonts.find((each) => each.hasGlyphForCodePoint(character.codePointAt(0) ?? 0)) ?? fonts[0];
    if (!font) continue;
    const last = found.at(-1);
    if (last && last.font === font) last.text += character;
    else found.push({ font, text: character });
  }
  return found;
}

const widths = new Map<string, number>();

/**
 * The width of a text in ems, as the sheet sets it.
 * @example textWidth("DADGAD", 600) // 2.762
 */
export function textWidth(text: string, weight: Weight): number {
  const key = `${weight}${text}`;
  const known = widths.get(key);
  if (known !== undefined) return known;
  const width = runs(text, weight).reduce(
    (sum, run) => sum + run.font.layout(run.text).advanceWidth / run.font.unitsPerEm,
    0,
  );
  if (widths.size > 5000) widths.clear();
  widths.set(key, width);
  return width;
}
