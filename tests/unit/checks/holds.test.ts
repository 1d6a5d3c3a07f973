import { describe, expect, it } from 'vitest'
import { judgePreHarvest, judgeReEntry } from '../../../shared/checks/judgeHolds.ts'
import type { LabelLimits } from '../../../shared/contract/input.ts'
import { buildFacts, buildLabel, buildMaterial } from './buildFacts.ts'

const ended = (...ends: (string | null)[]) =>
  buildFacts({
    content: { ...buildFacts().content, lines: ends.map((endedAt, index) => ({ blockId: `b${index + 1}`, startedAt: null, endedAt, amount: null })) },
  })
const labelled = (limits: Partial<LabelLimits>, name = 'Potash soap') => buildMaterial({ name, label: buildLabel(limits) })

describe('keep out', () => {
  it('runs from the end of the work to the minute, in the farm’s own time', () => {
    expect(judgeReEntry(ended('2026-06-16T12:37:00Z'), [labelled({ reEntryHours: '12' })])).toMatchObject({
      code: 'label.reEntry', verdict: 'caution', rests: 'label', about: 'line:0',
      title: { params: { hours: 12 } },
      text: { id: 'checks.reEntry.until', params: { blocks: 'A3', untilOn: '2026-06-16', untilTime: '20:37' } },
      figure: { params: { time: '20:37' } },
    })
  })

  it('takes the longest of several labels and the last of several ends', () => {
    const check = judgeReEntry(ended('2026-06-16T12:37:00Z', '2026-06-16T08:00:00-04:00'), [
      labelled({ reEntryHours: '4' }), labelled({ reEntryHours: '24' }, 'Copper'), labelled({ reEntryHours: '9' }),
    ])
    expect(check).toMatchObject({ text: { params: { blocks: 'A3, A2', untilOn: '2026-06-17', untilTime: '08:37' } }, source: { params: { material: 'Copper' } } })
  })

  it('counts hours, not clock faces, over the night the clocks go back', () => {
    // US daylight time ends 1 November 2026, 02:00: twelve hours after 20:00 EDT it is 07:00 EST.
    expect(judgeReEntry(ended('2026-11-01T00:00:00Z'), [labelled({ reEntryHours: '12' })])?.text.params).toMatchObject({ untilOn: '2026-11-01', untilTime: '07:00' })
  })

  it('takes a half hour', () => {
    expect(judgeReEntry(ended('2026-06-16T12:00:00Z'), [labelled({ reEntryHours: '0.5' })])?.figure?.params).toEqual({ time: '08:30' })
  })

  it('says how long from the end while a line has not ended', () => {
    expect(judgeReEntry(ended('2026-06-16T12:37:00Z', null), [labelled({ reEntryHours: '12' })])).toMatchObject({ verdict: 'caution', figure: null, text: { id: 'checks.reEntry.fromEnd' } })
  })

  it.each([{ name: 'no label', label: null }, { name: 'a silent label', label: buildLabel() }, { name: 'nought hours', label: buildLabel({ reEntryHours: '0' }) }])(
    'there is no hold by default: $name', ({ label }) => {
      expect(judgeReEntry(ended('2026-06-16T12:37:00Z'), [buildMaterial({ label })])).toBeNull()
    },
  )
})

describe('do not pick', () => {
  it('counts whole days after the civil day the work ended on the farm', () => {
    // 03:00 UTC on the 17th is still the 16th in New York.
    expect(judgePreHarvest(ended('2026-06-17T03:00:00Z'), [labelled({ preHarvestDays: 14 })])).toMatchObject({
      verdict: 'caution', text: { params: { pickOn: '2026-06-30', blocks: 'A3' } }, figure: { params: { dayOn: '2026-06-30' } },
    })
  })

  it('crosses 29 February', () => {
    expect(judgePreHarvest(ended('2028-02-27T12:00:00Z'), [labelled({ preHarvestDays: 3 })])?.text.params).toMatchObject({ pickOn: '2028-03-01' })
  })

  it('takes the longest and says nothing without one', () => {
    expect(judgePreHarvest(ended(null), [labelled({ preHarvestDays: 1 }), labelled({ preHarvestDays: 9 })])).toMatchObject({ title: { params: { days: 9 } }, text: { id: 'checks.preHarvest.fromEnd' } })
    expect(judgePreHarvest(ended('2026-06-17T03:00:00Z'), [labelled({ preHarvestDays: 0 }), buildMaterial()])).toBeNull()
  })
})
