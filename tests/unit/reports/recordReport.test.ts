import { describe, expect, it } from 'vitest'
import { buildCertificate } from '../../support/buildCertificate.ts'
import { buildRecordReportData } from '../../support/buildRecordReportData.ts'
import { buildChecks, buildSignedBlock, buildSignedRecord } from '../../support/buildSignedRecord.ts'
import { contentOf, drawRecord, readPdf } from '../../support/readPdf.ts'
import { readQr } from '../../support/readQr.ts'

const base = buildSignedRecord()

function buildLongRecord() {
  const materials = Array.from({ length: 20 }, (_none, index) => ({ ...base.materials[0]!, id: `m${index}`, name: `Ferment of willow ${index + 1}` }))
  const paragraph = 'The north rows dried last and were left for the second load. '
  return buildSignedRecord({
    materials,
    content: {
      ...base.content,
      components: materials.map(({ id }) => ({ materialId: id, lotId: null, basis: { kind: 'ratio', parts: '500', reading: 'to' }, used: null })),
      notes: paragraph.repeat(70).slice(0, 3990) + ' The end.',
    },
    checks: Array.from({ length: 5 }, () => buildChecks()).flat(),
  })
}

describe('the file', () => {
  it('is sound, tagged, in its language, with every font embedded', async () => {
    const pdf = readPdf(await drawRecord(buildRecordReportData()))
    expect(pdf.check).toContain('No syntax or stream encoding errors found')
    expect(pdf.info).toMatchObject({ Tagged: 'yes', 'PDF version': '1.7', Title: 'Record 2026-0143', Pages: '1', Encrypted: 'no', JavaScript: 'no' })
    expect(pdf.info['Page size']).toContain('A4')
    expect(pdf.plain).toMatch(/\/Lang \(en\)/)
    expect(pdf.plain).toContain('/DisplayDocTitle true')
    expect(pdf.fonts.length).toBeGreaterThan(3)
    for (const font of pdf.fonts) expect(font).toMatch(/NotoSans-\w+ +CID TrueType +Identity-H +yes yes yes/)
  })

  it('is the same to the byte for the same data, whatever was drawn between', async () => {
    const first = await drawRecord(buildRecordReportData())
    await drawRecord(buildRecordReportData({ language: 'es', names: { doneBy: 'é 1⁄2 Ōda', enteredBy: 'Олена', signedBy: 'Ệ' } }))
    expect((await drawRecord(buildRecordReportData())).equals(first)).toBe(true)
    expect((await drawRecord(buildRecordReportData({ printedAt: '2026-06-16T16:16:00Z' }))).equals(first)).toBe(false)
  })

  it('draws nothing that is neither in the structure nor passed over by readers by ear', async () => {
    const pdf = readPdf(await drawRecord(buildRecordReportData({ signed: buildLongRecord() })))
    let depth = 0
    const outside = contentOf(pdf).filter((line) => {
      if (/ B[DM]C$/.test(line)) depth += 1
      if (line === 'EMC') depth -= 1
      return depth === 0 && /(^| )(Tj|TJ|f\*?|F|B\*?|b\*?|S|s|Do|sh)$/.test(line)
    })
    expect(outside).toEqual([])
    expect(depth).toBe(0)
  })

  it('has heads, tables with their heads, and figures with words', async () => {
    const { structure, alts } = readPdf(await drawRecord(buildRecordReportData()))
    expect(structure.match(/\bH2\b/g)).toHaveLength(4)
    for (const kind of ['Document', 'H1', 'Table', 'THead', 'TBody', 'TR', 'TD', 'Figure']) expect(structure).toMatch(new RegExp(`\\b${kind}\\b`))
    expect(structure).toMatch(/TH:\s+\/Scope \/Column\s+"In all"/)
    expect(alts).toHaveLength(2)
    expect(alts).toContainEqual(expect.stringMatching(/^Plan at 1 : 3.717, north up\./))
    expect(alts).toContain('QR code of https://drenchleaf.example/check/41d70b9e6a2fc85319e4')
  })

  it('holds on a black printer: whatever carries words or lines is dark', async () => {
    const decoration = ['0.788235 0.788235 0.788235', '0.545098 0.474510 0.627451', '1 1 1']
    const colours = new Set(contentOf(readPdf(await drawRecord(buildRecordReportData({ state: 'withdrawn' }))))
      .flatMap((line) => /^([\d.]+ [\d.]+ [\d.]+) (?:scn|SCN)$/.exec(line)?.slice(1) ?? []))
    const light = [...colours].filter((colour) => {
      const [red = 0, green = 0, blue = 0] = colour.split(' ').map(Number)
      return 0.2126 * red + 0.7152 * green + 0.0722 * blue > 0.56
    })
    expect(colours.size).toBeGreaterThan(5)
    expect(light.filter((colour) => !decoration.some((known) => isNear(known, colour)))).toEqual([])
  })
})

function isNear(a: string, b: string): boolean {
  const other = b.split(' ').map(Number)
  return a.split(' ').map(Number).every((value, index) => Math.abs(value - (other[index] ?? 0)) < 0.01)
}

describe('what it says', () => {
  it('names what, where, when, by whom, how much and how known', async () => {
    const { text } = readPdf(await drawRecord(buildRecordReportData()))
    const flat = text.replace(/\s+/g, ' ')
    for (const words of [
      'Wennick Hollow, register of season 2026', '2026-0143', 'Foliar spray', '16 June 2026, 06:50 to 08:37', 'A3 Long Bank 3 and A2 Long Bank 2',
      'Aphids on shoot tips', 'A3 version 3 and A2 version 2', 'A3 whole 0.882 06:50 07:36 372.0 L measured', 'As drawn 1.88 791.3 L',
      'Lot NF-31 1:20 worked out 37.50 L 19.99 18.96 18.54', 'Spray: one load of 400.0 L and one of 391.3 L 791.3 L 421.8 400.0 391.3',
      '1.9 m/s, read here; from NW', 'Oda Verrill, 35 min after the end', '16 June 2026, 09:12:40, Oda Verrill, by password',
      'No stop found; 1 caution; 1 not known', 'Check code 41D7 0B9E 6A2F C853 19E4, entry 1 844 of the log', 'look it up at drenchleaf.example/check',
      'The farm runs this server itself.', 'Printed 16 June 2026, 09:15', 'page 1 of 1',
    ]) expect(flat).toContain(words)
    expect(flat).not.toMatch(/\bsafe\b|compliant/i)
  })

  it('bears a QR code that another reader reads, with white around it', async () => {
    expect(readQr(await drawRecord(buildRecordReportData()))).toEqual({ text: 'https://drenchleaf.example/check/41d70b9e6a2fc85319e4', isQuiet: true })
  })

  it('names the certificate at the head where it ran on the day of the work, and makes room for a long one', async () => {
    const certificate = buildCertificate({ validFrom: null, validUntil: '2026-06-16' })
    const pages = async (named: typeof certificate) => readPdf(await drawRecord(buildRecordReportData({ signed: buildLongRecord(), certificates: [named] }))).pages.map((page) => page.replace(/\s+/g, ' '))
    for (const page of await pages(certificate)) expect(page).toContain('Certificate OR-118, Oaklode Review, as of 16 June 2026')
    for (const page of await pages({ ...certificate, body: 'Review '.repeat(17).trim() })) expect(page).toMatch(/Review Review, as of 16 June 2026/)
    for (const page of await pages({ ...certificate, validUntil: '2026-06-15' })) expect(page).not.toContain('OR-118')
  })

  it('speaks Spanish with Spanish marks', async () => {
    const { text, plain } = readPdf(await drawRecord(buildRecordReportData({ language: 'es', runBy: 'Cooperativa Marl' })))
    expect(plain).toMatch(/\/Lang \(es\)/)
    for (const words of ['Aplicación foliar', '37,50', 'Carga llena', 'Cooperativa Marl lleva este servidor.', 'página 1 de']) expect(text.replace(/\s+/g, ' ')).toContain(words)
  })

  it('tells the three clocks as they were and marks what is late', async () => {
    const times = { ...base.times, deviceAt: '2026-06-13T16:00:00Z', receivedAt: '2026-06-19T16:12:04Z', signedAt: '2026-06-19T16:20:00Z' }
    const { text } = readPdf(await drawRecord(buildRecordReportData({ signed: buildSignedRecord({ times }) })))
    expect(text).toContain('Oda Verrill, late: 3 d after the end')
    expect(text.replace(/\s+/g, ' ')).toContain('13 June 2026, 09:00:00, 6 d behind the server')
    expect(text).toContain('19 June 2026, 09:12:04')
  })

  it('strikes a withdrawn record and says so on every page', async () => {
    const signed = { ...buildLongRecord(), record: { ...base.record, version: 3 }, entry: 'withdrawn' as const, replaces: 'c0de'.repeat(16), reason: 'Wrong block.' }
    const pdf = readPdf(await drawRecord(buildRecordReportData({ state: 'withdrawn', signed })))
    expect(pdf.pages.length).toBeGreaterThan(1)
    for (const page of pdf.pages) expect(page).toContain('Record 2026-0143, version 3, withdrawn')
    expect(pdf.text.replace(/\s+/g, ' ')).toContain('Because: Wrong block. It stays in the register and counts nowhere. It replaces version 2, check code C0DE C0DE C0DE C0DE C0DE.')
    expect(contentOf(pdf).join('\n')).toMatch(/1\.5 w\n\/DeviceRGB CS\n0\.68\d* 0\.22\d* 0\.17\d* SCN\n[\d.]+ ([\d.]+) m\n[\d.]+ \1 l\nS/)
  })

  it('gives the reasons for what was signed all the same', async () => {
    const acknowledged = [
      { code: 'label.re_entry', reason: 'The pickers were told.' }, { code: 'record.late', reason: 'No signal.' }, { code: 'new.code', reason: 'So it was.' },
    ]
    const { text } = readPdf(await drawRecord(buildRecordReportData({ signed: buildSignedRecord({ acknowledged }) })))
    expect(text).toContain('Signed all the same, and why')
    for (const row of ['Keep out, 12 h The pickers were told.', 'Entered late No signal.', 'new.code So it was.']) expect(text).toContain(row)
  })

  it('adds up what was written for the lines', async () => {
    const lines = base.content.lines.map((line, index) => ({ ...line, amount: { value: index ? '419.2983' : '371.9517', unit: 'L' as const, known: 'workedOut' as const } }))
    const shared = readPdf(await drawRecord(buildRecordReportData({ signed: buildSignedRecord({ content: { ...base.content, lines } }) })))
    expect(shared.text).toContain('A3 whole 0.882 06:50 07:36 372.0 L worked out')
    expect(shared.text).toContain('As drawn 1.88 791.3 L')
    const measured = readPdf(await drawRecord(buildRecordReportData()))
    expect(measured.text).toMatch(/As drawn 1\.88 \d+\.\d/)
  })

  it('prints what was signed where the sheet works out otherwise today, and says so', async () => {
    const computed = { ...base.computed, totalL: '801.5' }
    const { text } = readPdf(await drawRecord(buildRecordReportData({ signed: buildSignedRecord({ computed }) })))
    expect(text).toContain('801.5')
    expect(text).toContain('Worked out again today, a figure differs.')
    expect(text).not.toContain('18.96')
  })
})

describe('long and odd records', () => {
  it('repeats heads, keeps rows whole and runs notes on', async () => {
    const pdf = readPdf(await drawRecord(buildRecordReportData({ signed: buildLongRecord() })))
    expect(pdf.pages.length).toBeGreaterThanOrEqual(3)
    pdf.pages.forEach((page, index) => {
      expect(page).toContain(`page ${index + 1} of ${pdf.pages.length}`)
      expect(page).toContain('41D7 0B9E 6A2F C853 19E4')
    })
    const withMix = pdf.pages.filter((page) => /Ferment of willow/.test(page))
    for (const page of withMix) expect(page).toContain('Ingredient')
    expect(pdf.text.match(/Ferment of willow \d+/g)).toHaveLength(20)
    expect(pdf.text).toContain('The end.')
  })

  it('B-59, B-60: shows every letter it has, boxes the others, and loses none', async () => {
    const signed = buildSignedRecord({
      farm: { ...base.farm, name: '<b>&"Wenn" 農場' },
      content: { ...base.content, purpose: ') Tj /OpenAction << /S /JavaScript', notes: `≥ 5 1⁄2 Δ ₂ 천혜녹즙\nالمزرعة الشمالية\nשלום ${'W'.repeat(4000)}` },
    })
    const names = { doneBy: '👩‍🌾 Ōda عمر', enteredBy: 'Олена Ґ', signedBy: 'Nguyễn Thị Ệ' }
    const pdf = readPdf(await drawRecord(buildRecordReportData({ signed, names })))
    expect(pdf.check).toContain('No syntax or stream encoding errors found')
    for (const words of ['<b>&"Wenn"', '農場', 'Ōda', 'Олена Ґ, 35 min', 'Nguyễn Thị Ệ', '👩‍🌾', '≥ 5', '₂', '천혜녹즙', ') Tj /OpenAction << /S /JavaScript']) {
      expect(pdf.text).toContain(words)
    }
    // An independent reader gives words from the right as they were typed, between its own marks of direction.
    for (const word of ['عمر', 'المزرعة', 'الشمالية', 'שלום']) expect(pdf.text).toContain(word)
    for (const font of ['NotoSansSC', 'NotoSansKR', 'Vazirmatn', 'NotoEmoji', 'NotoSansHebrew']) {
      expect(pdf.fonts.filter((line) => line.includes(font)).every((line) => /yes yes yes/.test(line))).toBe(true)
      expect(pdf.fonts.join('\n')).toContain(font)
    }
    expect(pdf.text.match(/W/g)?.length).toBeGreaterThanOrEqual(4001)
    expect(pdf.text).toContain('stands for a character that this print has no letter for')
    expect(pdf.plain).not.toContain('OpenAction')
  })

  it('lists many blocks in a table of their own', async () => {
    const blocks = Array.from({ length: 60 }, (_none, index) => buildSignedBlock({ id: `b${index}`, code: `K${index + 1}`, name: `Kitchen strip ${index + 1}` }))
    const lines = blocks.map(({ id }) => ({ ...base.content.lines[0]!, blockId: id, amount: null }))
    const pdf = readPdf(await drawRecord(buildRecordReportData({ signed: buildSignedRecord({ blocks, content: { ...base.content, lines } }) })))
    expect(pdf.text).toContain('60 blocks, listed below')
    expect(pdf.text.match(/K\d+ Kitchen strip \d+, whole/g)).toHaveLength(60)
  })
})
