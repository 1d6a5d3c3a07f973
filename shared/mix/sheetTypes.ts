import type { UnitCode } from '../units/unitTable.ts'

/** A value as typed with its unit; the value is plain decimal text. */
export interface TypedQuantity { value: string; unit: string }

export type SheetBasis =
  | { kind: 'ratio'; parts: string }
  | { kind: 'perArea'; value: string; unit: string }
  | { kind: 'perTank'; value: string; unit: string }

export interface SheetInput {
  /** Ground treated on each block line, square metres. */
  lines: readonly { areaM2: number; amount?: TypedQuantity | null }[]
  water: { sizedFrom: 'water' | 'sprayRate'; value: string; unit: string } | null
  /** Usable tank volume, litres. */
  tankL: string | null
  components: readonly { basis: SheetBasis }[]
}

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
  /** This line's share of the total by area, litres; the shares add up to the total exactly. */
  shareL: string | null
  /** The amount written down for this line, litres; null where none is or it is no volume. */
  amountL: string | null
}

/** Litres, hectares and square metres that the contract gives as numbers are numbers; every other figure is plain decimal text. */
export interface RecordSheet {
  areaM2: number
  areaHa: number
  /** Carrier water, litres. */
  waterL: number | null
  /** All the spray, litres: water and every liquid component. */
  totalL: number | null
  sprayLPerHa: number | null
  loads: SheetLoads | null
  components: SheetComponent[]
  /** Carrier water on a hectare, in a full load and in the last part load, litres. */
  water: { perHa: string | null; perFullLoad: string | null; perLastLoad: string | null }
  /** Sum of the amounts written down on the lines, litres; null until each line says one by volume. */
  appliedL: string | null
  lines: SheetLine[]
  findings: SheetFinding[]
}
