import type { SheetOptions } from "#app/documents/stage-sheet/layout.ts";
import { renderStageSheet } from "#app/documents/stage-sheet/render.tsx";
import type { StageSheet } from "#app/documents/stage-sheet/sheet.ts";

export type SheetJob = { sheet: StageSheet; options: SheetOptions; author: string; at: Date };

/** Renders one stage sheet in a thread of the server's: 100 ms and more in which nobody else has to wait. */
export default async function render({ sheet, options, author, at }: SheetJob): Promise<Uint8Array> {
  return new Uint8Array(await renderStageSheet(sheet, options, author, at));
}
