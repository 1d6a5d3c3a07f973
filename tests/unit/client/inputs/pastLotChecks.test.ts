import { describe, expect, it } from 'vitest'
import { labelWords } from '../../../../shared/balance/labelWords.ts'
import { materialCautions } from '../../../../shared/balance/materialCautions.ts'
import { pastLotChecks } from '../../../../shared/balance/pastLotChecks.ts'
import { labelLimitsSchema } from '../../../../shared/contract/input.ts'
import { renderMessage } from '../../../../shared/messages/renderMessage.ts'
import { buildLot, buildMaterial } from './buildInputs.ts'

const today = '2026-06-16'
const label = labelLimitsSchema.parse({ maxRate: { value: '2.5', unit: 'L/ha' }, maxStrengthPct: '2', reEntryHours: '12', preHarvestDays: 7 })
const past = buildLot({ code: '26-018', expiresOn: '2026-05-31' })

describe('pastLotChecks', () => {
  it('rests on the label only for a bought lot of a labelled material', () => {
    const labelled = buildMaterial({ label })
    const restsOf = (lot: typeof past, material = labelled) => pastLotChecks([lot], [material], today).map(({ rests, verdict }) => [rests, verdict])
    expect(restsOf({ ...past, origin: 'bought' })).toEqual([['label', 'caution']])
    expect(restsOf({ ...past, origin: 'made' })).toEqual([['house', 'caution']])
    expect(restsOf({ ...past, origin: 'bought' }, buildMaterial())).toEqual([['house', 'caution']])
  })

  it('leaves out lots that are good today, have no date or are empty', () => {
    const lots = [
      buildLot({ expiresOn: today }), buildLot({ expiresOn: null }), { ...past, left: { value: '0', unit: 'L' as const } },
    ]
    expect(pastLotChecks(lots, [buildMaterial()], today)).toEqual([])
  })

  it('says in words which lot, since when and how much is left', () => {
    const [check] = pastLotChecks([past], [buildMaterial()], today)
    expect(check).toBeDefined()
    const words = [check?.title, check?.text, check?.figure].map((message) => (message ? renderMessage('en', message) : ''))
    expect(words[0]).toBe('Lot 26-018')
    expect(words[1]).toContain('31 May 2026')
    expect(words[2]).toBe('45 L')
  })
})

describe('labelWords', () => {
  it('says each limit that is set and nothing of the others', () => {
    expect(labelWords(label).map((message) => renderMessage('en', message))).toEqual([
      'at most 2.5 L/ha', 'at most 2\u00A0% in the tank', 'keep out 12 h', 'do not pick for 7 d',
    ])
    expect(labelWords(labelLimitsSchema.parse({}))).toEqual([])
  })

  it('joins both ends of a strength and says when no days are to be waited', () => {
    const both = labelLimitsSchema.parse({ minStrengthPct: '0.5', maxStrengthPct: '2', preHarvestDays: 0 })
    expect(labelWords(both).map((message) => renderMessage('es', message))).toEqual([
      'de 0,5 a 2\u00A0% en el tanque', 'sin días de espera antes de la cosecha',
    ])
  })
})

describe('materialCautions', () => {
  it('warns of gas from ferments, of the label of soaps, and always of jars that look like drinks', () => {
    expect(materialCautions('ferment', false)).toEqual(['inputs.caution.gas', 'inputs.caution.raw', 'inputs.caution.jars'])
    expect(materialCautions('soap', true)).toEqual(['inputs.caution.label', 'inputs.caution.jars'])
    expect(materialCautions('other', true)).toEqual(['inputs.caution.label', 'inputs.caution.jars'])
    expect(materialCautions('seaweed', false)).toEqual(['inputs.caution.jars'])
  })
})
