import { Writable } from 'node:stream'
import { describe, expect, it } from 'vitest'
import { renderReport } from '../../../server/reports/renderReport.ts'
import type { Language } from '../../../shared/messages/translate.ts'
import { readPdf } from '../../support/readPdf.ts'

async function draw(language: Language): Promise<Buffer> {
  const chunks: Buffer[] = []
  const data = { farm: { name: 'Wennick Hollow', zone: 'America/Los_Angeles' }, printedAt: '2026-06-16T16:15:00Z', language }
  await renderReport({ kind: 'blankRecord', data }, new Writable({
    write(chunk: Buffer, _encoding, done) {
      chunks.push(chunk)
      done()
    },
  }))
  return Buffer.concat(chunks)
}

describe('the blank record form', () => {
  it.each([['en', 'Injected drench', 'its label is the law'], ['es', 'Inyección en el suelo', 'la etiqueta es ley']] as const)('is one sound, tagged page in %s with the fields of a record', async (language, method, caution) => {
    const pdf = readPdf(await draw(language))
    expect(pdf.check).toContain('No syntax or stream encoding errors found')
    expect(pdf.info).toMatchObject({ Tagged: 'yes', Pages: '1' })
    for (const words of ['Wennick Hollow', method, caution]) expect(pdf.text.replace(/\s+/g, ' ')).toContain(words)
  })
})
