import type { Method } from '../contract/recordContent.ts'

/** What one block got in a season; decimals as unrounded text. */
export interface BlockSummary {
  /** Empty for what cannot be told apart by block. */
  blockId: string
  /** As the records call it. */
  code: string
  /** Passes by method; an injected drench is a drench. */
  foliar: number
  drench: number
  solid: number
  /** Hectares, each pass counted. */
  areaHa: string
  litres: string
  kg: string
  marks: { method: Method; on: string }[]
  /** Civil day of the last pass. */
  lastOn: string | null
}

/** Shares of a season, each with what it is a share of. */
export interface SeasonFigures {
  signed: number
  /** Numbers of the withdrawn. */
  withdrawn: string[]
  first: string | null
  last: string | null
  /** Civil days of the first and the last work. */
  from: string | null
  to: string | null
  /** Signed with at least one stop. */
  stops: number
  /** Entered more than 24 h after the work, and more than 7 days. */
  late: number
  veryLate: number
  /** With at least one check that is not known. */
  unknown: number
  /** Hectares, each pass counted. */
  areaHa: string
  litres: string
  /** Of the litres, those that were measured on their block. */
  litresMeasured: string
  kg: string
}

export interface SeasonSummary { figures: SeasonFigures; blocks: BlockSummary[] }
