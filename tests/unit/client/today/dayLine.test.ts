import { describe, expect, it } from 'vitest'
import { dayLine, type DayFacts } from '../../../../shared/today/dayLine.ts'
import { translate } from '../../../../shared/messages/translate.ts'

const quiet: DayFacts = { started: [], startedByOthers: [], lateJobs: [], dueJobs: 0, keepOut: [], drafts: 0, signedToday: 0, pastLots: [], soonLots: [] }
const ids = (facts: Partial<DayFacts>): string[] => dayLine({ ...quiet, ...facts }).map(({ id }) => id)

describe('dayLine', () => {
  it('says that nothing waits on a quiet day, and that nothing is signed', () => {
    expect(ids({})).toEqual(['today.line.quiet', 'today.line.noneSigned'])
  })

  it('puts started work before lots, drafts and what was signed', () => {
    expect(ids({ started: ['V2'], drafts: 1, signedToday: 3, pastLots: ['27'] })).toEqual([
      'today.line.startedOne', 'today.line.pastOne', 'today.line.drafts', 'today.line.signed',
    ])
  })

  it("puts the reader's own work before that of others, and says whose that is", () => {
    const facts = { started: ['V2'], startedByOthers: [{ codes: 'A3', name: 'Ruan Teal' }] }
    expect(ids(facts).slice(0, 2)).toEqual(['today.line.startedOne', 'today.line.othersOne'])
    expect(dayLine({ ...quiet, ...facts })[1]?.figures).toEqual({ codes: { text: 'A3', ink: 'wel' }, name: { text: 'Ruan Teal', ink: 'plain' } })
    expect(ids({ startedByOthers: [...facts.startedByOthers, { codes: 'A4', name: 'Tam Lisk' }] })[0]).toBe('today.line.othersMany')
  })

  it('names the one and counts the many', () => {
    expect(dayLine({ ...quiet, started: ['V2', 'S1'] })[0]).toMatchObject({ id: 'today.line.startedMany', figures: { figure: { text: '2', ink: 'wel' } } })
    expect(dayLine({ ...quiet, soonLots: [{ code: '31', day: '26 June' }] })[0]?.figures).toEqual({
      code: { text: '31', ink: 'plain' }, figure: { text: '26 June', ink: 'wel' },
    })
    expect(dayLine({ ...quiet, pastLots: ['27', '28'] })[0]).toMatchObject({ id: 'today.line.pastMany', count: 2 })
  })

  it('names a late job with its days before it counts those that are due, both before lots', () => {
    expect(ids({ lateJobs: [{ code: 'V5', days: 1 }], dueJobs: 6, pastLots: ['27'] }).slice(0, 3)).toEqual(['today.line.lateOne', 'today.line.due', 'today.line.pastOne'])
    expect(dayLine({ ...quiet, lateJobs: [{ code: 'V5', days: 1 }], dueJobs: 6 })[0]).toMatchObject({ count: 1, figures: { code: { text: 'V5', ink: 'mad' } } })
    expect(dayLine({ ...quiet, lateJobs: [{ code: 'V5', days: 3 }, { code: 'V6', days: 1 }] })[0]).toMatchObject({ id: 'today.line.lateMany', figures: { figure: { text: '2' } } })
  })

  it('lets lots past their use speak before lots that end soon', () => {
    expect(ids({ pastLots: ['27'], soonLots: [{ code: '31', day: '26 June' }] })).toEqual(['today.line.pastOne', 'today.line.noneSigned'])
  })

  it('says of one block until when to keep out, with the day where that is not today, and counts several', () => {
    const [today, later] = [{ code: 'V6', time: '09:01', day: null }, { code: 'V1', time: '10:00', day: '17 June' }]
    expect(dayLine({ ...quiet, drafts: 1, keepOut: [today] }).map(({ id }) => id)).toEqual(['today.line.drafts', 'today.line.keepOutOne', 'today.line.noneSigned'])
    expect(dayLine({ ...quiet, keepOut: [later] })[1]?.figures).toEqual({ code: { text: 'V1', ink: 'mad' }, time: { text: '10:00', ink: 'mad' }, day: { text: '17 June', ink: 'mad' } })
    expect(dayLine({ ...quiet, keepOut: [today, later] })[1]).toMatchObject({ id: 'today.line.keepOutMany', count: 2 })
  })

  it.each(['en', 'es'] as const)('has the words of every sentence in %s', (language) => {
    const all = [
      ...dayLine(quiet),
      ...dayLine({ ...quiet, keepOut: [{ code: 'V6', time: '09:01', day: '17 June' }] }),
      ...dayLine({ started: ['V2'], startedByOthers: [{ codes: 'A3', name: 'Ruan Teal' }], lateJobs: [{ code: 'V5', days: 1 }], dueJobs: 6, keepOut: [{ code: 'V6', time: '09:01', day: null }], drafts: 2, signedToday: 1, pastLots: [], soonLots: [{ code: '31', day: '26 June' }] }),
      ...dayLine({ started: ['V2', 'S1'], startedByOthers: [{ codes: 'A3', name: 'Ruan Teal' }, { codes: 'A4', name: 'Tam Lisk' }], lateJobs: [{ code: 'V5', days: 3 }, { code: 'V6', days: 1 }], dueJobs: 1, keepOut: [{ code: 'V6', time: '09:01', day: null }, { code: 'V1', time: '10:00', day: '17 June' }], drafts: 2, signedToday: 1, pastLots: ['27', '28'], soonLots: [] }),
    ]
    for (const { id, figures } of all) {
      const params = Object.fromEntries(Object.entries(figures).map(([name, { text }]) => [name, text]))
      const words = translate(language, id, params)
      for (const text of Object.values(params)) expect(words).toContain(text)
    }
    expect(all.length).toBeGreaterThan(8)
  })
})
