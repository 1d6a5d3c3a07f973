import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { openWords } from '../../../server/reports/record/reportWords.ts'
import { writeOutAmounts } from '../../../server/services/records/writeOutAmounts.ts'
import type { Computed } from '../../../shared/contract/record.ts'
import type { BlockLine, RecordContent } from '../../../shared/contract/recordContent.ts'
import { presentComputed } from '../../../shared/records/presentComputed.ts'
import { sheetOf } from '../../../shared/records/sheetOf.ts'
import { signFigures } from '../../../shared/records/signFigures.ts'
import { decimalTextOf } from '../../../shared/units/decimalTextOf.ts'
import { roundDecimal } from '../../../shared/units/roundDecimal.ts'
import { buildRecordReportData } from '../../support/buildRecordReportData.ts'
import { buildStrips } from '../../support/buildSampleRecords.ts'
import { buildSignedRecord } from '../../support/buildSignedRecord.ts'
import { drawRecord, readText } from '../../support/readPdf.ts'

const base = buildSignedRecord()
const [liquid, second] = base.materials
const words = openWords('en', base.farm.zone)
const blocks = buildStrips(4)

const decimal = (max: number) => fc.integer({ min: 1, max: max * 100 }).map((hundredths) => String(hundredths / 100))
const part = fc.oneof(
  fc.constant<BlockLine['part']>({ kind: 'whole' }),
  fc.integer({ min: 1, max: 99 }).map((percent): BlockLine['part'] => ({ kind: 'fraction', fraction: `0.${String(percent).padStart(2, '0')}` })),
  fc.integer({ min: 2, max: 40 }).map((of): BlockLine['part'] => ({ kind: 'rows', from: 2, to: of, of })),
)
const basis = fc.oneof(
  decimal(1000).map((parts): RecordContent['components'][number]['basis'] => ({ kind: 'ratio', parts, reading: 'to' })),
  fc.integer({ min: 10, max: 500 }).map((parts): RecordContent['components'][number]['basis'] => ({ kind: 'ratio', parts: String(parts), reading: 'in' })),
  decimal(9).map((value): RecordContent['components'][number]['basis'] => ({ kind: 'perArea', value, unit: 'L/ha' })),
  decimal(4).map((value): RecordContent['components'][number]['basis'] => ({ kind: 'perTank', value, unit: 'L' })),
  decimal(20).map((value): RecordContent['components'][number]['basis'] => ({ kind: 'total', value, unit: 'L' })),
  decimal(5).map((value): RecordContent['components'][number]['basis'] => ({ kind: 'perEach', value, unit: 'mL', each: 'plant' })),
)
const water = fc.oneof(
  decimal(4000).map((value): RecordContent['water'] => ({ sizedFrom: 'water', value, unit: 'L', source: null })),
  fc.integer({ min: 150, max: 900 }).map((rate): RecordContent['water'] => ({ sizedFrom: 'sprayRate', value: String(rate), unit: 'L/ha', source: null })),
  decimal(2).map((value): RecordContent['water'] => ({ sizedFrom: 'perEach', value, unit: 'L', each: 'plant', source: null })),
)
const records = fc.record({
  method: fc.constantFrom('foliar' as const, 'drench' as const, 'injected' as const),
  lines: fc.array(fc.record({ part, plants: fc.integer({ min: 50, max: 3000 }) }), { minLength: 1, maxLength: 4 }),
  bases: fc.array(basis, { minLength: 1, maxLength: 2 }),
  water,
  tankL: fc.constantFrom('400', '378.5412', '15'),
})

/** A record as it is signed: its amounts written out, its figures the sheet's. Null where the mix is more than it may hold. */
function sign({ method, lines, bases, water, tankL }: typeof records extends fc.Arbitrary<infer Value> ? Value : never) {
  const sprayer = { id: 's', code: 'M2', name: 'mist sprayer', tankL, flowLPerMin: '14.5' }
  const written: RecordContent = {
    ...base.content, method, water,
    lines: lines.map(({ part, plants }, index) => ({ ...base.content.lines[0]!, blockId: blocks[index]!.id, part, counts: { plant: String(plants) }, amount: null })),
    components: bases.map((basis, index) => ({ materialId: [liquid, second][index]!.id, lotId: null, basis, used: null })),
  }
  const sheet = sheetOf(written, { blocks, sprayer })
  if (sheet.findings.length > 0 || sheet.waterL === null || sheet.waterL <= 0) return null
  const content = writeOutAmounts(written, sheet)
  const computed = presentComputed({ content, sheet: sheetOf(content, { blocks, sprayer }), materials: base.materials, zone: base.farm.zone })
  return { computed, signed: buildSignedRecord({ content, blocks, sprayer, computed: signFigures(computed) }) }
}

/** A worked-out amount of a line is written down to a tenth of a millilitre, and printed from that. */
const STORED_DECIMALS = 4

/** Ways a figure may stand, more decimals than its size asks for among them: enough that its column comes to its total. */
const ways = (write: (extra: number) => string): string[] => [0, 1, 2, 3].map((extra) => write(extra).replace(/\s+/g, ' '))
const litres = (value: string | number | null, after = ''): string[][] =>
  value === null ? [] : [ways((extra) => `${words.amount(decimalText(value), extra)}${after}`)]
const decimalText = (value: string | number): string => (typeof value === 'number' ? decimalTextOf(value) : value)

/** Every figure of the API's answer that the print shows, rounded for reading and nothing else. */
function figuresOf({ totalL, waterL, sprayLPerHa, loads, areaM2, lines, sprayPerEach, components }: Computed): string[][] {
  return [
    ...litres(totalL, ' L'), ...litres(waterL, ' L'), ...litres(sprayLPerHa),
    ...components.flatMap(({ amount }) => litres(amount?.value ?? null, ` ${amount?.unit}`)),
    ways((extra) => words.hectares(areaM2, extra)),
    ...lines.flatMap((line) => [ways((extra) => words.hectares(line.areaM2, extra)), ...litres(line.shareL === null ? null : roundDecimal(decimalText(line.shareL), STORED_DECIMALS), ' L worked out')]),
    ...litres(sprayPerEach?.litres ?? null, ' L a plant'),
    ...(loads && loads.full > 0 ? [[`${loads.full === 1 ? 'one load' : `${loads.full} loads`} of ${words.tank(decimalTextOf(loads.tankL))} L`]] : []),
    ...(loads && loads.lastL > 0 ? litres(loads.lastL, ' L') : []),
  ]
}

describe('what is printed', () => {
  it('is what the API answers, rounded for reading alone', async () => {
    await fc.assert(fc.asyncProperty(records, async (record) => {
      const made = sign(record)
      fc.pre(made !== null)
      if (made === null) return
      const text = readText(await drawRecord(buildRecordReportData({ signed: made.signed, sites: [], neighbours: [] })))
      for (const figure of figuresOf(made.computed)) expect(figure.some((way) => text.includes(way)), figure.join(' or ')).toBe(true)
      expect(text).not.toContain('Worked out again today')
    }), { numRuns: 8 })
  }, 300_000)

  it('has loads that come to the total as printed', () => {
    fc.assert(fc.property(records, (record) => {
      const made = sign(record)
      fc.pre(made !== null)
      const loads = made?.computed.loads
      if (!made || !loads || made.computed.totalL === null) return
      expect(Math.abs(loads.full * loads.tankL + loads.lastL - made.computed.totalL)).toBeLessThan(1e-9 * made.computed.totalL)
    }))
  })
})
