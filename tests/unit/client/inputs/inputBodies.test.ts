import { describe, expect, it } from 'vitest'
import { createLotSchema, createMaterialSchema, countLotSchema } from '../../../../shared/contract/input.ts'
import { countBody, emptyLot, lotBody } from '../../../../src/components/input/lotDraft.ts'
import { emptyMaterial, materialBody } from '../../../../src/components/input/materialDraft.ts'

const id = '01980000-0000-7000-8000-000000000009'

describe('materialBody', () => {
  it('sends no label where none is said, and null for what a label leaves open', () => {
    const plain = createMaterialSchema.parse(materialBody(id, { ...emptyMaterial(), name: 'Kelp', kind: 'seaweed' }))
    expect(plain).toMatchObject({ label: null, statusBasis: null, organicStatus: 'unknown' })
    const draft = { ...emptyMaterial(), name: 'Soap', kind: 'soap' as const, hasLabel: true, maxStrengthPct: '1½', preHarvestDays: '0' }
    expect(createMaterialSchema.parse(materialBody(id, draft)).label).toEqual({
      maxRate: null, minStrengthPct: null, maxStrengthPct: '1.5', reEntryHours: null, preHarvestDays: 0, source: null,
    })
  })

  it.each([
    [{ name: ' ' }, 'name'],
    [{ kind: null }, 'kind'],
    [{ hasLabel: true, maxRate: '2,x' }, 'label.maxRate.value'],
    [{ hasLabel: true, preHarvestDays: '1.5' }, 'label.preHarvestDays'],
    [{ hasLabel: true, preHarvestDays: 'soon' }, 'label.preHarvestDays'],
  ])('is refused at its field for %j', (bad, path) => {
    const read = createMaterialSchema.safeParse(materialBody(id, { ...emptyMaterial(), name: 'Soap', kind: 'soap', ...bad }))
    expect(read.error?.issues.map((issue) => issue.path.join('.'))).toEqual([path])
  })
})

describe('lotBody and countBody', () => {
  it('reads a comma and a fraction as people type them', () => {
    const draft = { ...emptyLot(id, 'L', '2026-06-16'), code: '26-019', value: '2,5' }
    expect(createLotSchema.parse(lotBody(id, draft))).toMatchObject({ quantity: { value: '2.5', unit: 'L' }, source: null, expiresOn: null })
    expect(countLotSchema.parse(countBody(id, { revision: 3 }, { value: '0', unit: 'L', reason: 'Spilled' }))).toEqual({
      id, revision: 3, left: { value: '0', unit: 'L' }, reason: 'Spilled',
    })
  })

  it('is refused for an amount of nothing received and for a count without a reason', () => {
    const lot = createLotSchema.safeParse(lotBody(id, { ...emptyLot(id, 'L', '2026-06-16'), code: 'x', value: '0' }))
    expect(lot.error?.issues[0]?.message).toBe('number.above_zero')
    const count = countLotSchema.safeParse(countBody(id, { revision: 1 }, { value: '1', unit: 'L', reason: '' }))
    expect(count.error?.issues[0]).toMatchObject({ path: ['reason'], message: 'text.required' })
  })
})
