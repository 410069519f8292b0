import { getDocument, OPS } from "pdfjs-dist/legacy/build/pdf.mjs";

export type ReadItem = { text: string; x: number; y: number; width: number };
export type ReadPage = { width: number; height: number; text: string; items: ReadItem[] };
export type ReadPdf = {
  pages: ReadPage[];
  title: string;
  author: string;
  language: string;
  fontsEmbedded: boolean;
  fonts: string[];
};

/** Reads a PDF back with a library that had no part in making it. */
export async function readPdf(bytes: Uint8Array): Promise<ReadPdf> {
  const task = getDocument({ data: new Uint8Array(bytes), verbosity: 0, fontExtraProperties: true });
  const document = await task.promise;
  const pages: ReadPage[] = [];
  const fonts = new Map<string, boolean>();
  for (let number = 1; number <= document.numPages; number += 1) {
    const page = await document.getPage(number);
    const { width, height } = page.getViewport({ scale: 1 });
    const content = await page.getTextContent();
    const items = content.items.flatMap((item) =>
      "str" in item && item.str.trim() !== ""
        ? [{ text: item.str, x: item.transform[4], y: height - item.transform[5], width: item.width }]
        : [],
    );
    const operators = await page.getOperatorList();
    operators.fnArray.forEach((operator, index) => {
      if (operator !== OPS.setFont) return;
      const font = page.commonObjs.get(operators.argsArray[index][0]);
      fonts.set(font.name, !font.missingFile);
    });
    pages.push({ width, height, text: joined(items), items });
  }
  const { info } = await document.getMetadata();
  const about = info as { Title?: string; Author?: string; Language?: string };
  await task.destroy();
  return {
    pages,
    title: about.Title ?? "",
    author: about.Author ?? "",
    language: about.Language ?? "",
    fonts: [...fonts.keys()],
    fontsEmbedded: fonts.size > 0 && [...fonts.values()].every(Boolean),
  };
}

/** Items as a reader reads them: what touches on one line is one word, set in two faces where one lacks a letter. */
function joined(items: ReadItem[]): string {
  let text = "";
  items.forEach((item, index) => {
    const last = items[index - 1];
    const touches = last && Math.abs(last.y - item.y) < 0.5 && Math.abs(last.x + last.width - item.x) < 1;
    text += `${index === 0 || touches ? "" : " "}${item.text}`;
  });
  return text;
}
