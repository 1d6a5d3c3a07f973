import { describe, expect, it } from 'vitest'
import { presentDraft, type FarmStock } from '../../../../shared/register/presentDraft.ts'

const place = { language: 'en', units: 'metric', zone: 'America/Los_Angeles', season: 2026 } as const
const stock: FarmStock = {
  blocks: [{
    id: 'b1', code: 'A3', name: 'Long Bank 3', crop: null, areaM2: 9700, perimeterM: 400, version: 1, revision: 1, createdAt: '2026-03-01T08:00:00Z',
    endedOn: null, endedBy: null, fromIds: [], intoIds: [], land: null, counts: { plants: null, beds: null, rows: null, rowM: null },
    geometry: { type: 'Polygon', coordinates: [[[0, 0], [1, 0], [1, 1], [0, 0]]] },
  }],
  materials: [{
    id: 'm1', name: 'Nettle ferment', kind: 'ferment', measuredIn: 'volume', organicStatus: 'allowed', statusBasis: null, label: null,
    revision: 1, createdAt: '2026-03-01T08:00:00Z',
  }],
  lots: [{
    id: 'l1', materialId: 'm1', materialName: 'Nettle ferment', code: 'Batch 31', origin: 'made', source: null, receivedOn: '2026-06-13',
    quantity: { value: '60', unit: 'L' }, expiresOn: null, left: { value: '45', unit: 'L' }, revision: 1, createdAt: '2026-06-13T08:00:00Z',
  }],
  sprayers: [],
}
const draft = (content: unknown) => presentDraft({ id: 'd1', content, begunAt: '2026-06-16T13:38:00Z', by: 'Oda Verrill' }, stock, place)

describe('presentDraft', () => {
  it('works out area and litres of what is typed: 750 L of water and 1 part to 20 make 787.5 L', () => {
    const line = draft({
      method: 'foliar',
      lines: [{ blockId: 'b1', startedAt: null }],
      components: [{ materialId: 'm1', lotId: 'l1', basis: { kind: 'ratio', parts: '20' } }],
      water: { sizedFrom: 'water', value: '750', unit: 'L' },
      sprayerId: null,
    })
    expect(line).toMatchObject({
      state: 'draft', number: null, method: 'foliar', codes: 'A3', preparation: 'Nettle ferment', lots: 'Batch 31',
      area: '0.97', volume: '787.5', day: '16\u00a0Jun', start: '06:38', by: 'Oda Verrill', tally: null,
    })
  })

  it.each([[null], ['junk'], [{}], [{ method: 'fly', lines: 'x', components: [{ basis: 5 }], water: { value: '' } }]])(
    'takes half-typed or unreadable content %j without a figure',
    (content) => {
      expect(draft(content)).toMatchObject({ state: 'draft', codes: '', preparation: '', volume: '', rate: '' })
    },
  )

  it('leaves out a block that is no longer there', () => {
    expect(draft({ lines: [{ blockId: 'gone' }] })).toMatchObject({ codes: '', area: '', blockIds: [] })
  })
})
