/** The area of several blocks together, square metres, unrounded; 0 for none. */
export function totalAreaM2(blocks: readonly { areaM2: number }[]): number {
  return blocks.reduce((sum, { areaM2 }) => sum + areaM2, 0)
}
