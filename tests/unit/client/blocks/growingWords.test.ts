import { describe, expect, it } from 'vitest'
import '../../../../shared/messages/everyLanguage.ts'
import type { Bed } from '../../../../shared/contract/bed.ts'
import type { Planting } from '../../../../shared/contract/planting.ts'
import { bedBody, bedDraft } from '../../../../src/components/block/bedDraft.ts'
import { landBody, landDraft } from '../../../../src/components/block/landDraft.ts'
import { plantingBody, plantingDraft } from '../../../../src/components/block/plantingDraft.ts'
import { blockAllows } from '../../../../src/composables/block/blockAllows.ts'
import { areaDifference } from '../../../../src/composables/block/boundaryWords.ts'
import { bedLine, cropLine, harvestLines, landWords, plantingLine } from '../../../../src/composables/block/growingWords.ts'

const planting = (over: Partial<Planting> = {}): Planting => ({
  id: 'p1', blockId: 'b1', part: null, crop: 'Apple', eppo: 'MABSD', variety: 'Marl Pippin', plantedOn: '2014-03-20', removedOn: null,
  ediblePart: 'Fruit', soilContact: 'none', harvests: [], plants: 1640, revision: 3, ...over,
})
const bed = (over: Partial<Bed> = {}): Bed => ({
  id: 'r1', blockId: 'b1', kind: 'row', name: null, fromNumber: 1, toNumber: 16, count: 16, lengthM: '92.5', widthM: null, plants: null, endedOn: null, revision: 2, ...over,
})
const land = { status: 'certified', statusSince: '2019-04-02', lastProhibited: null, tenure: 'rented', tenureUntil: '2031-02-28', tenureNote: null } as const

describe('a block’s crop line', () => {
  it('names what stands, with its year, and counts what has no room', () => {
    expect(cropLine('en', [planting(), planting({ removedOn: '2020-01-01' })])).toBe('Apple, Marl Pippin, planted 2014')
    expect(cropLine('es', [planting({ variety: null, plantedOn: null })])).toBe('Apple')
    expect(cropLine('en', [planting(), planting({ crop: 'Pear' }), planting({ crop: 'Plum' })])).toMatch(/, and 1 more$/)
    expect(cropLine('en', [planting({ removedOn: '2020-01-01' })])).toBeNull()
  })
})

describe('lines', () => {
  it('say what was counted with its marks', () => {
    expect(plantingLine('en', planting())).toMatchObject({ title: 'Apple, Marl Pippin', note: 'planted 20 March 2014, 1\u00a0640 plants, MABSD', isPast: false })
    expect(bedLine({ language: 'en', units: 'metric' }, bed())).toMatchObject({ title: 'Rows 1 to 16', note: '92.5\u00a0m long each' })
    expect(bedLine({ language: 'es', units: 'metric' }, bed({ kind: 'bed', fromNumber: null, toNumber: null, name: 'Hierbas', count: 3, lengthM: null }))).toMatchObject({ title: 'Hierbas, 3 bancales', note: '' })
    expect(bedLine({ language: 'en', units: 'metric' }, bed({ toNumber: 1, endedOn: '2026-06-01' }))).toMatchObject({ title: 'Row 1', isPast: true })
  })

  it('keep harvests to come of what stands, earliest first', () => {
    const harvests = [{ from: '2026-09-08', to: '2026-09-30', note: null }, { from: '2026-05-01', to: '2026-05-02', note: null }]
    const found = harvestLines('en', [planting({ harvests }), planting({ id: 'p2', removedOn: '2026-01-01', harvests }), planting({ id: 'p3', harvests: [{ from: '2026-08-01', to: '2026-08-01', note: 'Thinnings' }] })], '2026-06-16')
    expect(found.map(({ title, span }) => [title, span])).toEqual([['Apple, Marl Pippin, Thinnings', '1 August 2026'], ['Apple, Marl Pippin', '8 September to 30 September 2026']])
  })
})

describe('land', () => {
  it('says what is written, and keeps not known apart from none written down', () => {
    expect(landWords('en', null)).toEqual({ status: null, lastProhibited: null, tenure: null })
    expect(landWords('en', land)).toEqual({ status: 'certified since 2 April 2019', lastProhibited: 'none written down', tenure: 'rented until 28 February 2031' })
  })

  it('never passes for want of a fact', () => {
    const verdicts = (of: Parameters<typeof blockAllows>[1]) => blockAllows('A3', of).filter(({ code }) => code === 'blocks.status').map(({ verdict }) => verdict)
    expect(verdicts(null)).toEqual(['unknown'])
    expect(verdicts(land)).toEqual(['unknown'])
    expect(verdicts({ ...land, status: 'transition' })).toEqual(['caution', 'unknown'])
    expect(verdicts({ ...land, lastProhibited: { substance: 'x', on: '2016-04-01', proof: 'y' } })).toEqual([])
  })

  it('says what a label holds, and never that nothing does', () => {
    const holds = (held: Parameters<typeof blockAllows>[3]) => blockAllows('A3', null, null, held).filter(({ code }) => code === 'blocks.holds').map(({ verdict, text }) => [verdict, text.id])
    expect(holds(undefined)).toEqual([['unknown', 'blocks.allows.holds.text']])
    expect(holds(null)).toEqual([['unknown', 'blocks.allows.holds.none']])
    expect(holds({ reEntryUntil: '2026-06-16T18:36:00Z', pickFrom: '2026-06-20', zone: 'America/Chicago' })).toEqual([['caution', 'checks.reEntry.until'], ['caution', 'checks.preHarvest.before']])
  })
})

describe('what is sent', () => {
  it('comes back as it was where nothing is changed', () => {
    const { id: _id, blockId: _block, revision: _revision, ...content } = planting({ harvests: [{ from: '2026-09-08', to: '2026-09-30', note: null }] })
    expect(plantingBody(plantingDraft(planting(content)))).toEqual(content)
    const { id: _bed, blockId: _of, revision: _seen, ...rows } = bed()
    expect(bedBody(bedDraft(bed()))).toEqual(rows)
    expect(landBody({ revision: 4 }, landDraft(land))).toEqual({ revision: 4, ...land })
  })

  it('leaves half-typed figures to their fields', () => {
    expect(plantingBody({ ...plantingDraft(null), plants: 'many' })).toMatchObject({ plants: 'many' })
    expect(bedBody({ ...bedDraft(null), from: '1', to: '' })).toMatchObject({ fromNumber: 1, toNumber: '' })
  })
})

describe('the difference of two outlines', () => {
  it.each([
    [10_000, 9_950, '−50\u00a0m² (−0.50 %)'], [9_950, 10_000, '+50\u00a0m² (+0.50 %)'], [10_000, 10_000, '0\u00a0m² (0.00 %)'],
  ])('from %d m² to %d m²: %s', (older, newer, words) => { expect(areaDifference({ language: 'en', units: 'metric' }, { areaM2: older }, { areaM2: newer })).toBe(words) })
})
