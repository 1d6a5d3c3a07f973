import { beforeAll, describe, expect, it } from 'vitest'
import fc from 'fast-check'
import { Writable } from 'node:stream'
import { openCanvas, type Canvas } from '../../../server/reports/parts/canvas.ts'
import { measureText } from '../../../server/reports/parts/setText.ts'
import { openCutter } from '../../../server/reports/register/cutVolumes.ts'
import { ROW_SETTING, rowHeightBound, widthBound } from '../../../server/reports/register/rowHeight.ts'
import { registerTable } from '../../../server/reports/register/registerTable.ts'
import { ledgerTableHeight } from '../../../server/reports/parts/ledgerTable.ts'
import { buildPrintedRow, buildRegisterReportData } from '../../support/buildRegisterReportData.ts'
import { contentOf, drawReport, readPdf, type ReadPdf } from '../../support/readPdf.ts'

const draw = async (overrides: Parameters<typeof buildRegisterReportData>[0] = {}) => drawReport({ kind: 'register', data: buildRegisterReportData(overrides) })

describe('a volume of the register on paper', () => {
  let pdf: ReadPdf
  beforeAll(async () => { pdf = readPdf(await draw()) })

  it('is a sound, tagged file on lying A4 with its letters in it', () => {
    expect(pdf.check).toContain('No syntax or stream encoding errors')
    expect(pdf.info).toMatchObject({ Tagged: 'yes', 'Page size': '841.89 x 595.28 pts (A4)', Title: 'Wennick Hollow, Register, season 2026' })
    expect(pdf.fonts.every((line) => / yes yes yes /.test(line))).toBe(true)
  })

  it('says on each page whose it is, which page of how many, and the heads of its columns', () => {
    const { length } = pdf.pages
    expect(length).toBeGreaterThan(2)
    pdf.pages.forEach((text, index) => {
      expect(text).toContain('Wennick Hollow')
      expect(text).toContain(`page ${index + 1} of ${length}`)
      expect(text).toMatch(/Preparation\s+Lot/)
    })
  })

  it('holds every record once, whole, with its check code', () => {
    const numbers = [...pdf.text.matchAll(/2026-(\d{4})/g)].map(([, number]) => Number(number))
    expect(numbers).toEqual(Array.from({ length: 60 }, (_, turn) => turn + 1))
    expect(pdf.text.match(/41D7 0B9E 6A2F\s+C853 19E4/g)).toHaveLength(60)
  })

  it('says what was chosen, what it adds up to and what is in no sum', () => {
    expect(pdf.pages[0]).toContain('Season: 2026; With the words: bank')
    expect(pdf.pages[0]?.replaceAll('\u00a0', ' ')).toContain('141 signed records, 130.65 ha passed over, 69 844 L, 120 kg by mass')
    expect(pdf.pages[0]).toContain('1 withdrawn, 1 not signed')
  })

  it('draws a line through a withdrawn record and through no other', async () => {
    const lines = (read: ReadPdf) => contentOf(read).filter((line) => /^0\.68\d* 0\.22\d* 0\.17\d* (SCN|RG)$/.test(line)).length
    expect(lines(pdf)).toBeGreaterThan(8)
    expect(lines(readPdf(await draw({ rows: [buildPrintedRow(7)] })))).toBe(0)
  })

  it('says that a time without records is empty', async () => {
    const { pages } = readPdf(await draw({ rows: [], totals: { records: 0, areaHa: '0', totalL: '0', totalKg: '0', found: 0, withdrawn: 0, unsigned: 0, late: 0, byMethod: {} } }))
    expect(pages).toHaveLength(1)
    expect(pages[0]).toContain('No record fits.')
  })

  it('names its volume on the cover and on every page', async () => {
    const { pages, info } = readPdf(await draw({ volume: 2, volumes: 7, language: 'es' }))
    expect(info['Title']).toContain('Volumen 2 de 7')
    for (const text of pages) expect(text).toContain('Volumen 2 de 7')
  })

  it('is the same bytes for the same records', async () => {
    expect((await draw()).equals(await draw())).toBe(true)
  })
})

describe('how high a row may become', () => {
  let canvas: Canvas
  beforeAll(() => {
    const nowhere = new Writable({ write: (_chunk, _encoding, done) => { done() } })
    canvas = openCanvas({ title: '', subject: '', keywords: '', createdAt: '2026-06-16T00:00:00Z', language: 'en', isLying: true }, nowhere)
  })
  const words = fc.array(fc.stringMatching(/^[A-Za-zÀ-ÿ0-9.,;:()%&+'’“”–—-]{1,18}$/), { minLength: 1, maxLength: 12 }).map((all) => all.join(' '))

  it('is no less than the words are wide', () => {
    fc.assert(fc.property(words, fc.constantFrom('regular' as const, 'bold' as const), (text, weight) => {
      expect(widthBound(text)).toBeGreaterThanOrEqual(measureText(canvas, text, { weight, size: ROW_SETTING.size }))
    }), { numRuns: 300 })
  })

  it('is no less than the row is drawn high', () => {
    const say = () => 'head'
    fc.assert(fc.property(fc.array(words, { maxLength: 20 }), fc.array(fc.stringMatching(/^[A-Z0-9]{1,12}$/), { maxLength: 60 }), words, (preparations, codes, by) => {
      const row = buildPrintedRow(0, { preparations, lots: preparations, blocks: codes.map((code) => ({ id: code, code })), by })
      const data = buildRegisterReportData({ rows: [row] })
      const table = registerTable(canvas, data, say)
      const bare = ledgerTableHeight(canvas, { ...table, rows: [] })
      expect(rowHeightBound(row, { language: 'en', zone: 'America/Los_Angeles' })).toBeGreaterThanOrEqual(ledgerTableHeight(canvas, table) - bare)
    }), { numRuns: 100 })
  })
})

describe('the cut into volumes', () => {
  it('begins one with the first row, and another when no page is left', () => {
    const cutter = openCutter(3)
    const begins = Array.from({ length: 20 }, () => cutter.take(140)).map((begin, index) => (begin ? index : -1)).filter((index) => index >= 0)
    // One row under the title, then three a page on two pages: seven a volume.
    expect(begins).toEqual([0, 7, 14])
  })

  it('keeps what is really drawn to its pages', async () => {
    const cutter = openCutter(4)
    const rows = Array.from({ length: 400 }, (_, turn) => buildPrintedRow(turn))
    const end = rows.findIndex((row, index) => cutter.take(rowHeightBound(row, { language: 'en', zone: 'America/Los_Angeles' })) && index > 0)
    const { pages } = readPdf(await draw({ rows: rows.slice(0, end) }))
    expect(pages.length).toBeLessThanOrEqual(4)
    expect(pages.length).toBeGreaterThanOrEqual(3)
  })
})
