import type { RecordReportData } from '../../server/reports/recordReportData.ts'
import { buildSignedRecord } from './buildSignedRecord.ts'

const CODE = '41d70b9e6a2fc85319e4'

/** Everything the record's PDF needs, of the demo farm's Long Bank. */
export function buildRecordReportData(overrides: Partial<RecordReportData> = {}): RecordReportData {
  return {
    signed: buildSignedRecord(),
    signedWith: 'password',
    digest: CODE.padEnd(64, '0'),
    reviews: [],
    newest: { version: (overrides.signed ?? buildSignedRecord()).record.version, digest: CODE.padEnd(64, '0') },
    names: { doneBy: 'Oda Verrill', enteredBy: 'Oda Verrill', signedBy: 'Oda Verrill' },
    neighbours: [
      { code: 'A1', geometry: { type: 'Polygon', coordinates: [[[-123.3140420, 44.6103557], [-123.3139, 44.6111], [-123.3158, 44.6112], [-123.3158377, 44.6104370], [-123.314042, 44.6103557]]] } },
      { code: 'P2', geometry: { type: 'Polygon', coordinates: [[[-123.31389, 44.6087], [-123.31389, 44.6100], [-123.3122, 44.6100], [-123.3122, 44.6087], [-123.31389, 44.6087]]] } },
    ],
    ground: [],
    sites: [
      { kind: 'stream', name: 'Wenn Brook', geometry: { type: 'LineString', coordinates: [[-123.31575, 44.6115], [-123.31605, 44.6106], [-123.31612, 44.6100], [-123.31588, 44.6096], [-123.31604, 44.6091], [-123.31637, 44.6083], [-123.3165, 44.607]] } },
      { kind: 'track', name: 'Hollow Lane', geometry: { type: 'LineString', coordinates: [[-123.3139, 44.6115], [-123.31394, 44.6101], [-123.31402, 44.6094], [-123.31407, 44.6086], [-123.3135538, 44.6071656]] } },
      { kind: 'well', name: 'Yard well', geometry: { type: 'Point', coordinates: [-123.3133517, 44.6089] } },
    ],
    state: 'signed',
    certificates: [],
    printedAt: '2026-06-16T16:15:00Z',
    checkUrl: `https://drenchleaf.example/check/${CODE}`,
    checkPage: 'drenchleaf.example/check',
    runBy: 'farm',
    language: 'en',
    ...overrides,
  }
}
