import { beforeAll, describe, expect, it } from 'vitest'
import { buildRecordReportData } from '../../support/buildRecordReportData.ts'
import { buildCertificate } from '../../support/buildCertificate.ts'
import { buildSeasonReportData } from '../../support/buildSeasonReportData.ts'
import { drawReport, readPdf, readText, type ReadPdf } from '../../support/readPdf.ts'
import { readQr } from '../../support/readQr.ts'

const draw = (overrides: Parameters<typeof buildSeasonReportData>[0] = {}) => drawReport({ kind: 'season', data: buildSeasonReportData(overrides) })
const plain = (text: string | undefined) => (text ?? '').replaceAll('\u00a0', ' ').replace(/\s+/g, ' ')

describe('a season on paper', () => {
  let pdf: ReadPdf
  beforeAll(async () => { pdf = readPdf(await draw()) })

  it('is a sound, tagged file with its letters in it', () => {
    expect(pdf.check).toContain('No syntax or stream encoding errors')
    expect(pdf.info).toMatchObject({ Tagged: 'yes', Title: 'Wennick Hollow, Season report 2026' })
    expect(pdf.fonts.every((line) => / yes yes yes /.test(line))).toBe(true)
  })

  it('begins with what was counted, up to which entry, and what the code does not show', () => {
    const cover = plain(pdf.pages[0])
    for (const words of [
      'Season report 2026', '1 March 2026 to 28 February 2027, running on 16 June 2026', '141, numbers 2026-0001 to 2026-0142', '1: 2026-0127',
      '30.45 ha passed over, 9 220 L', '3F9A 71C0 E2B4 8D16 57EE, up to entry 1 842 of the log', 'none is written down for these days', 'it does not show that what was entered is true',
    ]) expect(cover).toContain(words)
  })

  it('sums up by block, and says each share of how many', () => {
    const summary = plain(pdf.pages[1])
    for (const words of ['Summary by block', '24 blocks', '1 of 141', '4 of 141', '0 of 141', '61 % of 9 220 L', '88 of 141']) expect(summary).toContain(words)
    expect(summary.match(/A\d+ Apple/g)).toHaveLength(24)
  })

  it('lays the register down, and counts its pages through', () => {
    expect(pdf.pages.length).toBeGreaterThan(4)
    pdf.pages.forEach((text, index) => {
      expect(plain(text)).toContain(`page ${index + 1} of ${pdf.pages.length}`)
      expect(plain(text)).toMatch(index === 0 ? /Check code of the season 3F9A .* up to entry 1 842 of the log/ : /Check code of the season up to entry 1 842/)
    })
    expect([...pdf.text.matchAll(/^2026-(\d{4})/gm)].length).toBe(60)
  })

  it('holds no summary in a later volume, and says which it is', async () => {
    const { pages } = readPdf(await draw({ volume: 2, volumes: 3, blocks: [], language: 'es' }))
    expect(plain(pages[0])).toContain('Volumen 2 de 3')
    expect(pages.join(' ')).not.toContain('Resumen por parcela')
  })

  it('prints the certificate as the farm wrote it down, and that no last day is', async () => {
    const { pages } = readPdf(await draw({ certificates: [buildCertificate({ scope: 'Apples and pears', validFrom: '2026-01-05', validUntil: null })] }))
    expect(plain(pages[0])).toContain('OR-118, Oaklode Review, valid from 5 January 2026, no last day written down, as the farm wrote it down')
    expect(plain(pages[0])).toContain('Apples and pears')
  })

  it('names the certificate at the head of every page, as of the day of printing, and none where on some day of the work none was in force', async () => {
    const certificate = buildCertificate({ validFrom: '2026-03-09', validUntil: '2026-06-16' })
    const line = 'Certificate OR-118, Oaklode Review, as of 16 June 2026'
    for (const page of readPdf(await draw({ certificates: [certificate], rows: buildSeasonReportData().rows.slice(0, 2), blocks: [] })).pages) expect(plain(page)).toContain(line)
    const other = await Promise.all([{ ...certificate, validFrom: '2026-03-10' }, { ...certificate, validUntil: '2026-06-15' }].map((late) => draw({ certificates: [late], rows: [], blocks: [] })))
    for (const drawn of other) expect(readText(drawn)).not.toContain(line)
    expect(plain(pdf.text)).not.toContain('as of 16 June')
  })

  it('goes on naming what was in force in its season once the certificate is renewed, and both where it was renewed in it', async () => {
    const held = buildCertificate({ validFrom: '2025-06-01', validUntil: '2026-06-16' })
    const later = buildCertificate({ number: 'OR-119', validFrom: '2026-06-17', validUntil: '2027-06-16' })
    const head = plain(readPdf(await draw({ certificates: [held, later], rows: [], blocks: [] })).pages[0])
    expect(head).toContain('Certificate OR-118, Oaklode Review, as of 16 June 2026')
    expect(head).not.toContain('OR-119')
    const within = plain(readPdf(await draw({ certificates: [{ ...held, validUntil: '2026-12-31' }, { ...later, validFrom: '2026-05-01' }], rows: [], blocks: [], isRunning: false })).pages[0])
    expect(within).toContain('Certificates OR-118, Oaklode Review, until 30 April 2026; OR-119, Oaklode Review, from 1 May 2026; as of 16 June 2026')
    expect(within).toContain('OR-118, Oaklode Review, valid from 1 June 2025, runs until 30 April 2026, as the farm wrote it down')
  })

  it('bears a QR code on its first page that leads to its check page, with white around it and the code in words beside it', async () => {
    expect(readQr(await draw())).toEqual({ text: 'https://drenchleaf.example/check/3f9a71c0e2b48d1657ee', isQuiet: true })
    expect(pdf.alts).toEqual(['QR code of https://drenchleaf.example/check/3f9a71c0e2b48d1657ee'])
    expect(plain(pdf.pages[0])).toContain('Check code of the season 3F9A 71C0 E2B4 8D16 57EE, up to entry 1 842 of the log; look it up at drenchleaf.example/check')
    expect(readPdf(await draw({ head: null, checkUrl: null })).alts).toEqual([])
  })

  it('says that a season without records has none', async () => {
    const { pages } = readPdf(await draw({ rows: [], blocks: [], head: null, checkUrl: null, figures: { ...buildSeasonReportData().figures, signed: 0, first: null, last: null, from: null, to: null, withdrawn: [] } }))
    expect(pages).toHaveLength(1)
    expect(plain(pages[0])).toContain('No record was signed for this season.')
  })

  it('is the same bytes for the same season', async () => {
    expect((await draw()).equals(await draw())).toBe(true)
  })
})

describe('the sheets of a season on paper', () => {
  it('stand one after the other, each with its own code, over one count of pages', async () => {
    const one = buildRecordReportData()
    const two = { ...one, digest: 'b'.repeat(64), checkUrl: `${one.checkUrl.slice(0, -20)}${'b'.repeat(20)}` }
    const { records, ...season } = { ...buildSeasonReportData(), records: [one, two] }
    const pdf = readPdf(await drawReport({ kind: 'sheets', data: { ...season, records } }))
    expect(pdf.check).toContain('No syntax or stream encoding errors')
    expect(pdf.alts.filter((alt) => alt.includes('/check/'))).toHaveLength(2)
    expect(plain(pdf.text)).toContain('BBBB BBBB BBBB BBBB BBBB')
    pdf.pages.forEach((text, index) => { expect(plain(text)).toContain(`page ${index + 1} of ${pdf.pages.length}`) })
  })
})
