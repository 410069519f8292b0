export type Paper = "a4" | "letter";

/** Paper sizes in points (72 to the inch): ISO 216 A4, 210 × 297 mm; US Letter, 8.5 × 11 in. */
export const paperSizes: Record<Paper, { width: number; height: number }> = {
  a4: { width: 595.276, height: 841.89 },
  letter: { width: 612, height: 792 },
};

/** The white edge that printers leave: 12 mm in points. */
export const margin = 34;
