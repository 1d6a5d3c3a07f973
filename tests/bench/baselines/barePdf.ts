import type { Writable } from 'node:stream'
import PDFDocument from 'pdfkit'
import { openFonts } from '../../../server/reports/parts/openFonts.ts'

/** Words as a document set them: where, in which face, how large and in which colour. */
export interface SetWords { page: number; text: string; x: number; y: number; face: string; size: number; color: string }

/** The same words in the same fonts at the same places by the library alone: tagged, one paragraph each. */
export async function drawBare(words: readonly SetWords[], stream: Writable): Promise<void> {
  const fonts = openFonts()
  const settings = { size: [841.89, 595.28] as [number, number], margin: 0, pdfVersion: '1.7' as const, tagged: true, font: '', lang: 'en', autoFirstPage: false, bufferPages: true }
  const doc = new PDFDocument(settings)
  const done = new Promise((resolve, reject) => { stream.on('finish', resolve).on('error', reject) })
  doc.pipe(stream)
  for (const face of new Set(words.map((each) => each.face))) doc.registerFont(face, fonts.open(face))
  const root = doc.struct('Document')
  doc.addStructure(root)
  let pages = 0
  for (const { page, text, x, y, face, size, color } of words) {
    for (; pages <= page; pages++) doc.addPage()
    doc.switchToPage(page)
    root.add(doc.struct('P', {}, () => { doc.font(face).fontSize(size).fillColor(color).text(text, x, y, { lineBreak: false, baseline: 'alphabetic' }) }))
  }
  root.end()
  doc.end()
  await done
}
