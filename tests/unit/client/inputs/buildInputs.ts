import type { Lot, Material } from '../../../../shared/contract/input.ts'

/** A material without a label, allowed by a line of the plan. */
export const buildMaterial = (overrides: Partial<Material> = {}): Material => ({
  id: '01980000-0000-7000-8000-000000000200',
  name: 'Nettle ferment',
  kind: 'ferment',
  measuredIn: 'volume',
  organicStatus: 'allowed',
  statusBasis: 'System plan 2026, line 9',
  label: null,
  revision: 1,
  createdAt: '2026-03-01T08:00:00Z',
  ...overrides,
})

/** A lot of it, three quarters left, good until 26 June 2026. */
export const buildLot = (overrides: Partial<Lot> = {}): Lot => ({
  id: '01980000-0000-7000-8000-000000000300',
  materialId: '01980000-0000-7000-8000-000000000200',
  materialName: 'Nettle ferment',
  code: 'Batch 31',
  origin: 'made',
  source: null,
  receivedOn: '2026-06-13',
  quantity: { value: '60', unit: 'L' },
  expiresOn: '2026-06-26',
  left: { value: '45', unit: 'L' },
  revision: 1,
  createdAt: '2026-06-13T08:00:00Z',
  ...overrides,
})
