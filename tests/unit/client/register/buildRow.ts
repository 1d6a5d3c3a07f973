import type { RegisterRow } from '../../../../shared/contract/record.ts'

/** A signed row of the register; a test names only what it is about. */
export const buildRow = (overrides: Partial<RegisterRow> = {}): RegisterRow => ({
  id: '01980000-0000-7000-8000-000000000001',
  state: 'signed',
  number: '2026-0142',
  season: 2026,
  version: 1,
  method: 'drench',
  startedAt: '2026-06-16T12:05:00Z',
  endedAt: '2026-06-16T13:00:00Z',
  signedAt: '2026-06-16T13:05:00Z',
  blocks: [{ id: 'block-t1', code: 'T1' }, { id: 'block-t2', code: 'T2' }],
  preparations: ['Leaf-mould brew'],
  lots: ['Brew 34'],
  areaHa: '0.1401',
  totalL: '346',
  totalKg: null,
  sprayLPerHa: '2469.664',
  kgPerHa: null,
  sprayPerEach: null,
  by: 'Ruan Abel',
  lateHours: null,
  tally: { stop: 0, caution: 0, unknown: 2 },
  ...overrides,
})
