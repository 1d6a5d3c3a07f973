import { z } from 'zod'
import type { Block } from '../contract/block.ts'
import type { Lot, Material } from '../contract/input.ts'
import type { Sprayer } from '../contract/farm.ts'
import { basisSchema, countsSchema, methodSchema, partSchema, waterSchema } from '../contract/recordContent.ts'
import { partArea } from '../geo/partArea.ts'
import { formatDayShort } from '../messages/formatDayShort.ts'
import { areaFor, unitFor } from '../messages/readFigure.ts'
import { recordSheet } from '../mix/recordSheet.ts'
import type { RecordSheet } from '../mix/sheetTypes.ts'
import { lineCounts } from '../records/lineCounts.ts'
import { civilDateIn, civilTimeIn } from '../time/civilDate.ts'
import { presentRate, presentVolume, type RegisterPlace } from './presentRow.ts'
import { decimalTextOf } from '../units/decimalTextOf.ts'
import { presentBlocks } from './presentBlocks.ts'
import { presentEach } from './presentEach.ts'
import type { RegisterLine } from './registerLine.ts'

/** Half-typed content of a record: whatever does not read is left out of the line. */
const draftSchema = z.object({
  method: methodSchema.nullable().catch(null),
  lines: z
    .array(z.object({
      blockId: z.string().nullable().catch(null),
      part: partSchema.catch({ kind: 'whole' }),
      counts: countsSchema.catch({}),
      startedAt: z.string().nullable().catch(null),
    }))
    .catch([]),
  components: z
    .array(z.object({
      materialId: z.string().nullable().catch(null),
      lotId: z.string().nullable().catch(null),
      basis: basisSchema.nullable().catch(null),
    }))
    .catch([]),
  water: waterSchema.nullable().catch(null),
  sprayerId: z.string().nullable().catch(null),
})
type DraftContent = z.infer<typeof draftSchema>

export interface DraftFacts {
  id: string
  /** As it lies on the device; shape not trusted. */
  content: unknown
  begunAt: string
  by: string
}

/** What the farm has, to name and size what a draft points at. */
export interface FarmStock {
  blocks: readonly Block[]
  materials: readonly Material[]
  lots: readonly Lot[]
  sprayers: readonly Sprayer[]
}

/** A draft of this device as a line of the register, its figures worked out as far as they are typed. */
export function presentDraft(draft: DraftFacts, stock: FarmStock, place: RegisterPlace): RegisterLine {
  const { language, zone } = place
  const content = draftSchema.catch({ method: null, lines: [], components: [], water: null, sprayerId: null }).parse(draft.content)
  const blocks = content.lines.flatMap(({ blockId }) => stock.blocks.find(({ id }) => id === blockId) ?? [])
  const sheet = blocks.length === 0 ? null : sheetOf(content, stock)
  const totalL = sheet?.totalL ?? null
  const each = sheet?.sprayPerEach ?? null
  const at = content.lines[0]?.startedAt ?? draft.begunAt
  return {
    id: draft.id,
    state: 'draft',
    number: null,
    fullNumber: null,
    onDevice: true,
    version: 1,
    method: content.method,
    ...presentBlocks(blocks),
    preparation: namesOf(content.components.map(({ materialId }) => materialId), stock.materials, 'name'),
    lots: namesOf(content.components.map(({ lotId }) => lotId), stock.lots, 'code'),
    day: formatDayShort(language, civilDateIn(zone, at)),
    start: civilTimeIn(zone, at),
    area: sheet === null ? '' : areaFor(place, sheet.areaM2),
    areaText: sheet === null ? '' : `${areaFor(place, sheet.areaM2)}\u00A0${unitFor(place, 'ha')}`,
    ...presentVolume(place, totalL),
    mass: '',
    rate: each ? presentEach(place, { each: each.each, litres: decimalTextOf(each.litres) }) : presentRate(place, sheet?.sprayLPerHa ?? null, 'L/ha'),
    by: draft.by,
    lateHours: null,
    tally: null,
  }
}

function sheetOf(content: DraftContent, stock: FarmStock): RecordSheet {
  return recordSheet({
    lines: content.lines.flatMap((line) => {
      const block = stock.blocks.find(({ id }) => id === line.blockId)
      return block ? [{ areaM2: partArea(line.part, block.areaM2), counts: lineCounts(line) }] : []
    }),
    isDry: content.method === 'solid',
    water: content.water,
    tankL: stock.sprayers.find(({ id }) => id === content.sprayerId)?.tankL ?? null,
    components: content.components.flatMap(({ basis }) => (basis === null ? [] : [{ basis }])),
  })
}

function namesOf<Name extends string>(
  ids: readonly (string | null)[], things: readonly ({ id: string } & Record<Name, string>)[], name: Name,
): string {
  return ids.flatMap((id) => things.find((thing) => thing.id === id)?.[name] ?? []).join(', ')
}
