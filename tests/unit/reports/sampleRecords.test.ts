import { describe, expect, it } from 'vitest'
import { METHODS } from '../../../shared/contract/recordContent.ts'
import { buildRecordReportData } from '../../support/buildRecordReportData.ts'
import { buildAmended, buildFirstSchema, buildPlantDrench, buildSixBlocks, buildSolidSpread, buildStrips, buildWithdrawn } from '../../support/buildSampleRecords.ts'
import { buildSignedRecord } from '../../support/buildSignedRecord.ts'
import { contentOf, drawRecord, readPdf, readText } from '../../support/readPdf.ts'

const base = buildSignedRecord()
const textOf = async (signed: typeof base): Promise<string> => readText(await drawRecord(buildRecordReportData({ signed, sites: [], neighbours: [] })))

describe('block lines', () => {
  it('say part, stage, amount with how known, and what is held', async () => {
    const text = await textOf(buildSixBlocks())
    for (const words of [
      'K1 whole six leaves (BBCH 16) 0.545 06:04 06:27 120.4 L counted 18:27 20 June 2026', 'K2 part, as drawn', 'K3 rows 3 to 8 of 12', 'K5 50 % of it eight leaves',
      'As drawn and counted 2.38 891.9 L', 'used, measured: 2.50 L more than worked out, 6.67 % 40 L', 'one load of 400.0 L (about 28 min) and one of 391.3 L (about 27 min)',
      'PA 1143, private applicator', 'gloves, eye protection and long sleeves', 'Papers and photos', 'Soap label PDF 88 kB 2c26b46b68ffc68ff99b453c1d30413413422d706483bfa0f98a5e886266e7ae',
    ]) expect(text).toContain(words)
  })

  it('say what is counted, and a mix in N with its loads', async () => {
    const text = await textOf(buildPlantDrench())
    for (const words of [
      'K1 beds 3 to 8 of 12 240 plants', '1 365 plants', 'sized from 0.75 L a plant; 1 in N means 1 part in N parts of the mix', '1.5 mL a plant', '1 in 50',
      'Drench, 0.75 L a plant: 2 loads of 378.5412 L and one of 266.7 L', 'used, counted: 0.0475 L less than worked out, 2.32 % 2 L', 'not known: needs air and humidity',
    ]) expect(text).toContain(words)
  })

  it('weigh a solid, with the day it was worked in', async () => {
    const text = await textOf(buildSolidSpread())
    for (const words of ['Solid spread', 'Worked in 17 June 2026', 'What was spread', '2 500 kg/ha', 'By weight 5 159.2 kg 2 750.0 kg']) expect(text).toContain(words)
    expect(text).not.toContain('Carrier water')
  })
})

describe('versions', () => {
  it('say why one was amended, what it replaces and who reviewed it', async () => {
    const text = readText(await drawRecord(buildAmended()))
    for (const words of ['Amended, version 2. Because: The second load went on A2', 'It replaces version 1, check code 77E0 BBBB BBBB BBBB BBBB.', 'Marl Hensley, 18 June 2026, 10:05: Tank book seen.']) {
      expect(text).toContain(words)
    }
  })

  it('say who took one back and why', async () => {
    const text = readText(await drawRecord(buildWithdrawn()))
    for (const words of ['Withdrawn by Oda Verrill, 16 June 2026, 09:12. Because: Entered twice: 2026-0142 is the same work. It stays in the register and counts nowhere.', 'Record 2026-0143, version 3, withdrawn']) {
      expect(text).toContain(words)
    }
  })

  it('say so where a newer one stands, and print a text of the first schema', async () => {
    const text = readText(await drawRecord(buildRecordReportData({ signed: buildFirstSchema(), newest: { version: 2, digest: 'ab'.repeat(32) } })))
    for (const words of ['Version 1 no longer stands. The newest is version 2, check code ABAB ABAB ABAB ABAB ABAB.', 'A3 whole 0.882 06:50 07:36 372.0 L measured', 'not worked out in a version of this age']) {
      expect(text).toContain(words)
    }
    expect(text).not.toContain('Worked out again today')
  })
})

describe('the plan', () => {
  const strips = buildStrips(1)
  const ring: [number, number][] = [[-123.3158, 44.6086], [-123.3154, 44.6086], [-123.3154, 44.6088], [-123.3158, 44.6088], [-123.3158, 44.6086]]
  const draw = async (method: (typeof METHODS)[number], part: (typeof base)['content']['lines'][number]['part']): Promise<string[]> => {
    const components = [{ ...base.content.components[0]!, basis: { kind: 'total' as const, value: '5', unit: 'L' as const } }]
    const water = method === 'solid' ? null : base.content.water
    const content = { ...base.content, method, components, water, lines: [{ ...base.content.lines[0]!, blockId: 'strip-1', part }] }
    return contentOf(readPdf(await drawRecord(buildRecordReportData({ signed: buildSignedRecord({ blocks: strips, content }), sites: [], neighbours: [] }))))
  }

  it('hatches the whole, what was drawn of it, and nothing that was only counted', async () => {
    const clips = async (part: Parameters<typeof draw>[1]): Promise<number> => (await draw('drench', part)).filter((line) => line === 'W* n').length
    expect(await clips({ kind: 'whole' })).toBe(1)
    expect(await clips({ kind: 'drawn', geometry: { type: 'Polygon', coordinates: [ring] } })).toBe(2)
    expect(await clips({ kind: 'beds', from: 1, to: 3, of: 9 })).toBe(0)
  })

  it('fills each way of applying by its own shape', async () => {
    const shapes = new Set<string>()
    for (const method of METHODS) {
      const lines = await draw(method, { kind: 'whole' })
      const from = lines.indexOf('W* n')
      shapes.add(lines.slice(from, from + 40).filter((line) => / (w|d|m|l)$/.test(line)).slice(0, 6).join('\n'))
    }
    expect(shapes.size).toBe(METHODS.length)
  })
})
