import type { Bed } from '../../../shared/contract/bed.ts'
import type { FarmEvent } from '../../../shared/contract/farmEvent.ts'
import type { Land } from '../../../shared/contract/land.ts'
import type { Planting } from '../../../shared/contract/planting.ts'
import { formatDay } from '../../../shared/messages/formatDay.ts'
import { formatDayShort } from '../../../shared/messages/formatDayShort.ts'
import { renderMessage } from '../../../shared/messages/renderMessage.ts'
import { storedFor, unitFor, type Reader } from '../../../shared/messages/readFigure.ts'
import { translate, type Language } from '../../../shared/messages/translate.ts'

/** A line of a list: what it is, and the rest of it in small words. */
export interface GrowingLine {
  id: string
  title: string
  note: string
  /** Taken out, given up or taken back: no more there. */
  isPast: boolean
}

const MOST_CROPS = 2
const join = (parts: (string | null | false)[]): string => parts.filter((part) => typeof part === 'string' && part !== '').join(', ')

/** "Apple, Marl Pippin". */
export const cropName = ({ crop, variety }: Pick<Planting, 'crop' | 'variety'>): string => join([crop, variety])

/** What stands on a block in one line, "Apple, Marl Pippin, planted 2014"; null where no planting is written down. */
export function cropLine(language: Language, plantings: readonly Planting[]): string | null {
  const standing = plantings.filter(({ removedOn }) => removedOn === null)
  const words = standing.map((planting) => (planting.plantedOn === null
    ? cropName(planting)
    : translate(language, 'growing.crop.planted', { crop: cropName(planting), year: planting.plantedOn.slice(0, 4) })))
  const shown = words.slice(0, MOST_CROPS).join('; ')
  if (words.length === 0) return null
  return words.length <= MOST_CROPS ? shown : translate(language, 'growing.crop.more', { crops: shown, count: words.length - MOST_CROPS })
}

export function plantingLine(language: Language, planting: Planting): GrowingLine {
  const { id, plantedOn, removedOn, plants, part, eppo } = planting
  return {
    id,
    title: cropName(planting),
    note: join([
      plantedOn !== null && translate(language, 'growing.plantings.plantedIn', { day: formatDay(language, plantedOn) }),
      removedOn !== null && translate(language, 'growing.plantings.removedIn', { day: formatDay(language, removedOn) }),
      plants !== null && renderMessage(language, { id: 'growing.counted.plants', params: { count: plants } }),
      part !== null && translate(language, 'growing.plantings.onPart'),
      eppo,
    ]),
    isPast: removedOn !== null,
  }
}

export function bedName(language: Language, { kind, name, fromNumber, toNumber, count }: Bed): string {
  if (fromNumber === null || toNumber === null) return join([name, translate(language, kind === 'bed' ? 'growing.counted.beds' : 'growing.counted.rows', { count })])
  const one = fromNumber === toNumber
  const id = kind === 'bed' ? (one ? 'growing.beds.bedOne' : 'growing.beds.bedSpan') : (one ? 'growing.beds.rowOne' : 'growing.beds.rowSpan')
  return join([translate(language, id, { from: String(fromNumber), to: String(toNumber) }), name])
}

export function bedLine(reader: Reader, bed: Bed): GrowingLine {
  const { language } = reader
  const { id, lengthM, widthM, plants, endedOn } = bed
  const figure = (metres: string) => `${storedFor(reader, metres, 'm')}\u00A0${unitFor(reader, 'm')}`
  return {
    id,
    title: bedName(language, bed),
    note: join([
      lengthM !== null && translate(language, 'growing.beds.eachLong', { figure: figure(lengthM) }),
      widthM !== null && translate(language, 'growing.beds.eachWide', { figure: figure(widthM) }),
      plants !== null && renderMessage(language, { id: 'growing.counted.plants', params: { count: plants } }),
      endedOn !== null && translate(language, 'growing.beds.ended', { day: formatDay(language, endedOn) }),
    ]),
    isPast: endedOn !== null,
  }
}

/** An event of the farm as a line of a block's list. */
export interface EventLine extends GrowingLine { day: string }

export function eventLine(language: Language, { id, kind, on, note, by, withdrawn }: FarmEvent): EventLine {
  return {
    id,
    day: formatDayShort(language, on),
    title: translate(language, `growing.events.kindOf.${kind}`),
    note: join([note, by.name, withdrawn !== null && translate(language, 'growing.events.withdrawn', { name: withdrawn.by.name, reason: withdrawn.reason })]),
    isPast: withdrawn !== null,
  }
}

/** A harvest that is planned, of a planting that stands. */
export interface HarvestLine { id: string; from: string; to: string; title: string; span: string }

/** Harvests planned that end on a day or after, earliest first. */
export function harvestLines(language: Language, plantings: readonly Planting[], from: string): HarvestLine[] {
  return plantings
    .filter(({ removedOn }) => removedOn === null)
    .flatMap((planting) => planting.harvests.map((harvest, index) => ({
      id: `${planting.id}-${index}`, from: harvest.from, to: harvest.to, title: join([cropName(planting), harvest.note]),
      span: harvest.from === harvest.to
        ? formatDay(language, harvest.from)
        : translate(language, 'growing.harvests.span', { from: formatDay(language, harvest.from, { year: harvest.from.slice(0, 4) !== harvest.to.slice(0, 4) }), to: formatDay(language, harvest.to) }),
    })))
    .filter(({ to }) => to >= from)
    .sort((a, b) => a.from.localeCompare(b.from))
}

/** How the land stands, line by line; a line that nobody wrote is null: not known. */
export function landWords(language: Language, land: Land | null): { status: string | null; lastProhibited: string | null; tenure: string | null } {
  if (land === null) return { status: null, lastProhibited: null, tenure: null }
  const { status, statusSince, lastProhibited, tenure, tenureUntil, tenureNote } = land
  const words = translate(language, `growing.land.statusOf.${status}`)
  const held = tenure === null ? null : translate(language, `growing.land.tenureOf.${tenure}`)
  return {
    status: statusSince === null ? words : translate(language, 'growing.land.since', { status: words, day: formatDay(language, statusSince) }),
    lastProhibited: lastProhibited === null
      ? translate(language, 'growing.land.noneNoted')
      : translate(language, 'growing.land.prohibited', { ...lastProhibited, day: formatDay(language, lastProhibited.on) }),
    tenure: held === null ? null : join([tenureUntil === null ? held : translate(language, 'growing.land.until', { tenure: held, day: formatDay(language, tenureUntil) }), tenureNote]),
  }
}
