import { describe, expect, it } from 'vitest'
import { partOpenWork } from '../../../../shared/today/openWork.ts'
import OpenWork from '../../../../src/components/today/OpenWork.vue'
import { presentRow } from '../../../../shared/register/presentRow.ts'
import { buildRow } from '../register/buildRow.ts'
import { mountWithWords } from '../mountWithWords.ts'

const PLACE = { language: 'en', units: 'metric', zone: 'America/Los_Angeles', season: 2026 } as const
const started = (id: string, by: string) => presentRow(buildRow({ id, by, state: 'started', number: null, signedAt: null }), PLACE)
const lines = [started('theirs', 'Ruan Teal'), started('mine', 'Tam Lisk')]

describe('partOpenWork', () => {
  it("tells the reader's own from what others began; a draft of the device is always their own", () => {
    const draft = { ...started('draft', 'Another Name'), onDevice: true }
    const { own, others } = partOpenWork([...lines, draft], 'Tam Lisk')
    expect(own.map(({ id }) => id)).toEqual(['mine', 'draft'])
    expect(others.map(({ id }) => id)).toEqual(['theirs'])
  })
})

describe('OpenWork', () => {
  it('lists own work first, names who began the rest, and offers only to open what may not be gone on with', () => {
    const { own, others } = partOpenWork(lines, 'Tam Lisk')
    const list = mountWithWords(OpenWork, { own, others, outlines: new Map(), canGoOn: (line: { id: string }) => line.id === 'mine', hrefOf: () => '/' })
    const rows = list.findAll('li').map((row) => row.text())
    expect(rows[0]).not.toContain('Tam Lisk')
    expect(rows[0]).toContain('Go on')
    expect(rows[1]).toContain('Ruan Teal')
    expect(rows[1]).toContain('Open')
  })
})
