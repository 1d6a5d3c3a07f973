import type { CalibrationInForce } from '../contract/calibration.ts'
import type { Lot, Material } from '../contract/input.ts'
import type { KnownAmount } from '../contract/quantity.ts'
import type { Method } from '../contract/recordContent.ts'
import type { Weather } from '../contract/weather.ts'
import type { RecordSheet } from '../mix/sheetTypes.ts'

export interface FactLine {
  blockId: string
  startedAt: string | null
  endedAt: string | null
  /** How the amount is known; null while none is written. */
  amount: Pick<KnownAmount, 'known'> | null
}

/** The part of a record's content that is judged; half-written drafts leave out what is not there yet. */
export interface FactContent {
  method: Method
  lines: readonly FactLine[]
  /** In the order of `sheet.components`. */
  components: readonly { materialId: string; lotId: string | null; used?: Pick<KnownAmount, 'value' | 'unit'> | null }[]
  weather: Pick<Weather, 'wind' | 'air' | 'humidity'> | null
}

export type FactMaterial = Pick<Material, 'id' | 'name' | 'organicStatus' | 'statusBasis' | 'label'>
export type FactLot = Pick<Lot, 'id' | 'code' | 'origin' | 'receivedOn' | 'expiresOn' | 'left'>

/** Everything a record is judged by, as it stands at `now`. */
export interface RecordFacts {
  content: FactContent
  /** Worked out with the amounts written on the lines, once they are. */
  sheet: RecordSheet
  blocks: readonly { id: string; code: string }[]
  materials: readonly FactMaterial[]
  /** Each with what is left before this record takes its share. */
  lots: readonly FactLot[]
  /** What it is sprayed with, and the calibration that was in force on that day. */
  sprayer: { code: string; calibration: Pick<CalibrationInForce, 'on' | 'dueOn' | 'rateLPerHa'> | null } | null
  /** IANA time zone of the land. */
  zone: string
  /** Instant of the judgement, RFC 3339; the day of use where no start is written. */
  now: string
}
