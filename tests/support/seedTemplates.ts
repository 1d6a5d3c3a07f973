import { buildBlock, buildLot, buildMaterial, squareAt } from '../../server/demo/buildThings.ts'
import type { Block } from '../../server/entities/Block.ts'
import type { Lot } from '../../server/entities/Lot.ts'
import type { Material } from '../../server/entities/Material.ts'
import { judgeRecord } from '../../server/services/records/judgeRecord.ts'
import { recordTerms } from '../../server/services/register/recordTerms.ts'
import type { Check, Computed, RegisterRow } from '../../shared/contract/record.ts'
import { recordContentSchema, type RecordContent } from '../../shared/contract/recordContent.ts'
import { measurePolygon } from '../../shared/geo/measurePolygon.ts'
import { registerRow } from '../../shared/records/registerRow.ts'

/** Stand for the start and the end of the work in the text of a template. */
export const START = '2000-01-01T00:00:00Z'
export const END = '2000-01-01T01:00:00Z'

export interface SeedGround { blocks: Block[]; materials: Material[]; lots: Lot[]; people: { id: string; name: string }[] }

/** A record with everything that is worked out of it, to be written many times with other times and numbers. */
export interface SeedTemplate {
  content: RecordContent
  computed: Computed
  checks: Check[]
  row: Omit<RegisterRow, 'id' | 'state'>
  terms: string[]
  kg: string
  doneById: string
  blockIds: string[]
  components: { materialId: string; lotId: string | null; value: string | null; unit: string | null }[]
}

const PURPOSES = ['Aphids on shoot tips', 'Leaf vigour after pruning', 'Mildew seen on the lower leaves', 'Root growth after planting', 'Calcium before set', 'Soil life, spring round', 'Wake the soil under the rows', null]
const NOTES = [null, null, null, 'Wind rose at the end, the last row was left for the evening.', null, 'Nozzle 3 was changed.', null, 'Canopy wet from dew until nine.']
const MATERIALS = ['Nettle ferment', 'Leaf-mould brew', 'Potash soap', 'Fish amino extract', 'Seaweed extract', 'Wood vinegar', 'Egg-shell calcium', 'Rice-wash culture', 'Comfrey ferment', 'Basalt meal']
const BLOCK_NAMES = ['Long Bank', 'Mill Piece', 'Orchard Foot', 'Stony Half', 'Well Ground', 'Hazel Strip']
const TEMPLATES = 120

/** Blocks, materials and lots as they are stored, for a farm that is filled with records. */
export function buildGround(farmId: string, people: SeedGround['people']): SeedGround {
  const createdAt = new Date('2016-01-02T08:00:00Z')
  const common = { farmId, revision: 1, creationDigest: 'seeded', createdAt }
  const blocks = Array.from({ length: 24 }, (_, place): Block => {
    const geometry = squareAt(100 + place) as Block['geometry']
    const { areaM2, perimeterM } = measurePolygon(geometry)
    const { id, crop, code, name } = buildBlock({ code: `S${place + 1}`, name: `${BLOCK_NAMES[place % BLOCK_NAMES.length]} ${place + 1}`, crop: 'Apple' })
    return { ...common, id, code, name, crop, geometry, areaM2: String(areaM2), perimeterM: String(perimeterM), version: 1, endedOn: null, endedBy: null, fromIds: [], intoIds: [], land: null, acknowledged: [] }
  })
  const materials = MATERIALS.map((name, place): Material => {
    const isMass = name === 'Basalt meal'
    const { label, statusBasis, ...rest } = buildMaterial({ name: `${name} (${place + 1})`, kind: isMass ? 'mineral' : 'ferment', measuredIn: isMass ? 'mass' : 'volume' })
    return { ...rest, ...common, label, statusBasis }
  })
  const lots = materials.flatMap((material, place) => [1, 2].map((turn): Lot => {
    const unit = material.measuredIn === 'mass' ? 'kg' as const : 'L' as const
    const { id, code, origin, source, receivedOn, expiresOn } = buildLot({ materialId: material.id, code: `SL-${place + 1}${turn}`, receivedOn: '2016-01-02' })
    return { ...common, id, materialId: material.id, code, origin, source, receivedOn, expiresOn, quantity: '900000', unit, leftQuantity: '900000' }
  }))
  return { blocks, materials, lots, people }
}

/** Records as the program itself works them out, no two alike. */
export function buildTemplates(ground: SeedGround, zone: string): SeedTemplate[] {
  return Array.from({ length: TEMPLATES }, (_, turn) => buildTemplate(ground, zone, turn))
}

function buildTemplate({ blocks, materials, lots, people }: SeedGround, zone: string, turn: number): SeedTemplate {
  const person = pick(people, turn * 7)
  const onBlocks = Array.from({ length: [1, 1, 2, 1, 3, 1, 1, 8][turn % 8] ?? 1 }, (_, more) => pick(blocks, turn * 5 + more))
  const mixed = Array.from({ length: [1, 2, 1, 3][turn % 4] ?? 1 }, (_, more) => pick(materials, turn * 3 + more))
  const isFoliar = turn % 5 < 3
  const content = recordContentSchema.parse({
    method: isFoliar ? 'foliar' : 'drench',
    lines: onBlocks.map(({ id }) => ({ blockId: id, part: { kind: 'whole' }, counts: {}, stage: null, bbch: null, startedAt: START, endedAt: END, amount: null })),
    components: mixed.map(({ id, measuredIn }) => ({
      materialId: id,
      lotId: pick(lots.filter(({ materialId }) => materialId === id), turn).id,
      basis: measuredIn === 'mass' ? { kind: 'perArea', value: '120', unit: 'kg/ha' } : { kind: 'ratio', parts: String(20 + (turn % 9) * 10), reading: 'to' },
      used: null,
    })),
    water: isFoliar
      ? { sizedFrom: 'sprayRate', value: String(300 + (turn % 7) * 50), unit: 'L/ha', source: 'Rain tank 2' }
      : { sizedFrom: 'water', value: String(400 + (turn % 11) * 130), unit: 'L', source: null },
    sprayerId: null,
    workedInOn: null,
    protection: [],
    weather: { wind: { value: '1.9', unit: 'ms', kind: 'readHere' }, windFrom: 'NW', air: { value: '14.5', unit: 'degC', kind: 'readHere' }, humidity: null },
    purpose: pick(PURPOSES, turn),
    licence: null,
    notes: pick(NOTES, turn + 3),
    doneById: person.id,
  })
  const stock = { blocks: onBlocks, materials: mixed, lots: lots.filter(({ id }) => content.components.some(({ lotId }) => lotId === id)), sprayer: null, calibration: null }
  const { sheet, computed, checks } = judgeRecord(content, stock, zone, new Date(END))
  const row = registerRow({ content, sheet, checks, ...stock, doneBy: person.name, signed: null })
  const record = { state: 'started' as const, content, computed, doneById: person.id, registerRow: row }
  return {
    content, computed, checks, row,
    terms: recordTerms(record, onBlocks.map(({ name }) => name)).filter((term) => !term.startsWith('s:')),
    kg: row.totalKg ?? '0',
    doneById: person.id,
    blockIds: onBlocks.map(({ id }) => id),
    components: content.components.map(({ materialId, lotId }, place) => {
      const amount = computed.components[place]?.amount ?? null
      return { materialId, lotId, value: amount?.value ?? null, unit: amount?.unit ?? null }
    }),
  }
}

function pick<Thing>(things: readonly Thing[], turn: number): Thing {
  const thing = things[turn % things.length]
  if (thing === undefined) throw new Error('nothing to pick from')
  return thing
}
