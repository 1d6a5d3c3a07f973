import type { Method } from '../contract/recordContent.ts'

/** What a line of the register shows, in the words and measures of a reader; empty text where there is nothing to show. */
export interface RegisterLine {
  id: string
  state: 'draft' | 'started' | 'signed' | 'withdrawn'
  /** Number as the ledger prints it, short inside its own season; null before signing. */
  number: string | null
  /** The same with its year. */
  fullNumber: string | null
  /** A draft that only this device has. */
  onDevice: boolean
  version: number
  method: Method | null
  blockIds: string[]
  codes: string
  /** As much of them as a narrow column holds. */
  codesShort: string
  preparation: string
  lots: string
  day: string
  start: string
  /** Ground treated, a figure in hectares or acres; and the same with its unit. */
  area: string
  areaText: string
  /** What was put on by volume, a figure in litres or US gallons; and the same with its unit. */
  volume: string
  volumeText: string
  /** With its unit: of what was spread solid. */
  mass: string
  rate: string
  by: string
  lateHours: number | null
  /** Checks by verdict; null for a draft, which the server has not judged. */
  tally: { stop: number; caution: number; unknown: number } | null
}
