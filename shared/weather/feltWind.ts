/** How wind is felt without an instrument, calmest first. */
export const FELT_WINDS = ['calm', 'light', 'leaves', 'branches'] as const
export type FeltWind = (typeof FELT_WINDS)[number]

interface FeltRange {
  /** Beaufort numbers it covers. */
  beaufort: readonly [from: number, to: number]
  /** Metres a second at 10 m over open ground, both ends taken in. */
  ms: readonly [low: string, high: string]
  /** The middle of it, metres a second: what a record holds of a wind that was felt. */
  middleMs: string
}

/**
 * What is felt and seen of the wind, by the numbers of the Beaufort scale: 0 and 1 smoke rises or drifts; 2 felt on the face, leaves rustle;
 * 3 leaves and twigs move all the time; 4 small branches move.
 * @source Beaufort scale, WMO-No. 306, Manual on Codes, code table 1100.
 */
export const FELT_RANGES: Readonly<Record<FeltWind, FeltRange>> = {
  calm: { beaufort: [0, 1], ms: ['0', '1.5'], middleMs: '0.8' },
  light: { beaufort: [2, 2], ms: ['1.6', '3.3'], middleMs: '2.5' },
  leaves: { beaufort: [3, 3], ms: ['3.4', '5.4'], middleMs: '4.4' },
  branches: { beaufort: [4, 4], ms: ['5.5', '7.9'], middleMs: '6.7' },
}
