import type { Each } from '../contract/each.ts'
import type { Counts } from '../contract/recordContent.ts'
import type { UnitCode } from '../units/unitTable.ts'

/** A value as typed with its unit; the value is plain decimal text. */
export interface TypedQuantity { value: string; unit: string }

export type SheetBasis =
  /** 1 part to N parts of water, or with reading `in` 1 part in N parts of the mix; unread means `to`. */
  | { kind: 'ratio'; parts: string; reading?: 'to' | 'in' | undefined }
  | { kind: 'perArea'; value: string; unit: string }
  | { kind: 'perEach'; value: string; unit: string; each: Each }
  | { kind: 'perTank'; value: string; unit: string }
  | { kind: 'total'; value: string; unit: string }

/** How the mix is sized; see `waterSchema` of the contract. */
export type SheetWater =
  | { sizedFrom: 'water' | 'sprayRate'; value: string; unit: string }
  | { sizedFrom: 'perEach'; value: string; unit: string; each: Each }
  | { sizedFrom: 'jar'; component: number; value: string; unit: string }
  | { sizedFrom: 'none' }

export interface SheetInput {
  /** Ground treated on each block line, square metres, and what is counted on it. */
  lines: readonly { areaM2: number; counts?: SheetCounts; amount?: TypedQuantity | null }[]
  /** A solid is spread dry: no water, no tank. */
  isDry?: boolean
  water: SheetWater | null
  /** Usable tank volume, litres. */
  tankL: string | null
  /** What the sprayer puts out, litres a minute. */
  flowLPerMin?: string | null
  components: readonly { basis: SheetBasis }[]
}

export type SheetCounts = { readonly [Key in Each]?: string | undefined }

export interface SheetMessage { id: string; params: Record<string, string | number> }
export interface SheetFinding { code: string; params: Record<string, string | number>; path?: string }

export interface SheetLoads {
  /** Loads that fill the tank. */
  full: number
  /** All loads, the last part load included. */
  count: number
  tankL: number
  /** Litres in the last part load; 0 where the tank divides the total. */
  lastL: number
  lastAreaHa: number
  /** Minutes of spraying in a full load and in the last part load; null where the flow is not known. */
  fullMinutes: number | null
  lastMinutes: number | null
}

export interface SheetComponent {
  /** In the unit the basis was written in (litres for a ratio). */
  amount: { value: string; unit: UnitCode } | null
  /** The same amount in litres, null for a mass. */
  inL: string | null
  /** The same amount in kilograms, null for a volume. */
  inKg: string | null
  /** Litres or kilograms a hectare treated. */
  perHa: string | null
  /** In the amount's unit; null where no load is full. */
  perFullLoad: string | null
  /** In the amount's unit; null where there is no part load. */
  perLastLoad: string | null
  /** How the amount was found, for the working. */
  measure: SheetMessage
}

export interface SheetLine {
  areaHa: number
  /** This line's share of the total, litres: by count where the mix is sized so, else by area. The shares add up to the total exactly. */
  shareL: string | null
  /** Its share of what is weighed, kilograms. */
  shareKg: string | null
  /** The amount written down for this line, litres; null where none is or it is no volume. */
  amountL: string | null
  /** The same by mass, kilograms. */
  amountKg: string | null
}

/** Litres, hectares and square metres that the contract gives as numbers are numbers; every other figure is plain decimal text. */
export interface RecordSheet {
  areaM2: number
  areaHa: number
  /** What is counted on all lines together; a count that a line lacks is not there. */
  counts: Counts
  /** Carrier water, litres. */
  waterL: number | null
  /** All the mix, litres: water and every liquid component. */
  totalL: number | null
  /** All that is weighed, kilograms; null where nothing is, or not all of it is known. */
  totalKg: number | null
  sprayLPerHa: number | null
  kgPerHa: number | null
  /** The mix for each of what it is sized by. */
  sprayPerEach: { each: Each; litres: number } | null
  loads: SheetLoads | null
  components: SheetComponent[]
  /** Carrier water on a hectare, in a full load and in the last part load, litres. */
  water: { perHa: string | null; perFullLoad: string | null; perLastLoad: string | null }
  /** Sum of the amounts written down on the lines, litres; null until each line says one by volume. */
  appliedL: string | null
  /** The same by mass, kilograms. */
  appliedKg: string | null
  lines: SheetLine[]
  findings: SheetFinding[]
}
