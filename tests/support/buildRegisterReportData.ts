import type { PrintedRow, RegisterReportData } from '../../server/reports/registerReportData.ts'

const PREPARATIONS = [['Nettle ferment'], ['Leaf-mould brew', 'Seaweed extract'], ['Potash soap', 'Nettle ferment', 'Rice-wash culture'], ['Basalt meal']]

/** A row of the printed register; a test names only what it is about. */
export function buildPrintedRow(turn: number, overrides: Partial<PrintedRow> = {}): PrintedRow {
  const preparations = PREPARATIONS[turn % PREPARATIONS.length] ?? []
  const day = new Date(Date.UTC(2026, 2, 9) + turn * 7_200_000).toISOString()
  return {
    state: 'signed', number: `2026-${String(turn + 1).padStart(4, '0')}`, season: 2026, version: 1,
    method: (['foliar', 'drench', 'injected', 'solid'] as const)[turn % 4] ?? 'foliar',
    startedAt: day, endedAt: day, signedAt: day,
    blocks: (turn % 5 === 0 ? ['A1', 'A2', 'A3', 'P1', 'P2', 'N1'] : ['A1']).map((code) => ({ id: code, code })),
    preparations, lots: preparations.map((_name, place) => `NF-${turn % 40}${place}`),
    areaHa: '0.9945', totalL: turn % 4 === 3 ? null : '419.3', totalKg: turn % 4 === 3 ? '120' : null,
    sprayLPerHa: turn % 4 === 3 ? null : '421.6', kgPerHa: turn % 4 === 3 ? '120.6' : null, sprayPerEach: null,
    by: 'Oda Verrill', lateHours: turn % 23 === 0 ? 41 : null, tally: { stop: turn % 31 === 0 ? 1 : 0, caution: 0, unknown: turn % 3 },
    digest: '41d70b9e6a2fc85319e4'.padEnd(64, '0'),
    ...overrides,
  }
}

/** Everything a volume of the register needs. */
export function buildRegisterReportData(overrides: Partial<RegisterReportData> = {}): RegisterReportData {
  return {
    farm: { name: 'Wennick Hollow', zone: 'America/Los_Angeles' }, language: 'en', volume: 1, volumes: 1,
    filter: { season: 2026, q: 'bank' }, names: { block: null, material: null, person: null }, sort: 'when',
    totals: { records: 141, areaHa: '130.65', totalL: '69844', totalKg: '120', found: 143, withdrawn: 1, unsigned: 1, late: 4, byMethod: {} },
    rows: Array.from({ length: 60 }, (_, turn) => buildPrintedRow(turn, turn === 7 ? { state: 'withdrawn' } : {})),
    printedAt: '2026-06-16T16:15:00Z', checkPage: 'drenchleaf.example/check', certificates: [],
    ...overrides,
  }
}
