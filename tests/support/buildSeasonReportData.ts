import type { SeasonReportData } from '../../server/reports/seasonReportData.ts'
import { buildPrintedRow } from './buildRegisterReportData.ts'

const SQUARE = { type: 'Polygon' as const, coordinates: [[[-120.6, 46.6], [-120.598, 46.6], [-120.5985, 46.601], [-120.6, 46.601], [-120.6, 46.6]]] as [number, number][][] }

/** Everything a volume of the season report needs; a test names only what it is about. */
export function buildSeasonReportData(overrides: Partial<SeasonReportData> = {}): SeasonReportData {
  return {
    farm: { name: 'Wennick Hollow', zone: 'America/Los_Angeles' }, language: 'en', season: 2026, isRunning: true, volume: 1, volumes: 1,
    certificates: [], span: { from: '2026-03-01', to: '2027-02-28' }, head: { seq: 1842, digest: '3f9a71c0e2b48d1657ee'.padEnd(64, '0') },
    figures: {
      signed: 141, withdrawn: ['2026-0127'], first: '2026-0001', last: '2026-0142', from: '2026-03-09', to: '2026-06-16',
      stops: 1, late: 4, veryLate: 0, unknown: 88, areaHa: '30.445', litres: '9219.7', litresMeasured: '5624', kg: '0',
    },
    blocks: Array.from({ length: 24 }, (_, turn) => ({
      blockId: `block-${turn}`, code: `A${turn + 1}`, foliar: 9, drench: turn % 3, solid: 0, areaHa: '1.26854166', litres: '384.154', kg: '0',
      marks: Array.from({ length: 9 }, (_each, place) => ({ method: place % 4 === 3 ? 'drench' as const : 'foliar' as const, on: `2026-0${3 + Math.floor(place / 3)}-1${place}` })),
      lastOn: '2026-06-15', crop: 'Apple', areaM2: '9400', geometry: SQUARE,
    })),
    rows: Array.from({ length: 60 }, (_, turn) => buildPrintedRow(turn, turn === 7 ? { state: 'withdrawn' } : {})),
    printedAt: '2026-06-16T13:50:00Z', checkPage: 'drenchleaf.example/check',
    checkUrl: 'https://drenchleaf.example/check/3f9a71c0e2b48d1657ee',
    ...overrides,
  }
}
