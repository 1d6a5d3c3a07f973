/** Sheets that a document can be printed on, upright, points. @source ISO 216 (A4 210 × 297 mm, A3 297 × 420 mm); ANSI/ASME Y14.1 (letter 8.5 × 11 in). */
export const PAPERS = {
  a4: { width: 595.28, height: 841.89 },
  a3: { width: 841.89, height: 1190.55 },
  letter: { width: 612, height: 792 },
} as const
export type Paper = keyof typeof PAPERS
