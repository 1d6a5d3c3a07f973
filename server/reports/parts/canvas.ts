import type { Writable } from 'node:stream'
import PDFDocument from 'pdfkit'
import type { Language } from '../../../shared/messages/translate.ts'
import type { Weight } from './fontFiles.ts'
import { openFonts, type Fonts } from './openFonts.ts'
import { splitRuns, type Run } from './splitRuns.ts'

export type Element = PDFKit.PDFStructureElement
/** How words are set; size and leading in points. */
export interface TextStyle { size: number; leading: number; weight: Weight; color: string }

/** One PDF being made: the document, its fonts, its structure. */
export interface Canvas {
  doc: PDFKit.PDFDocument
  root: Element
  /** True once a letter had to be drawn as a box. */
  hasReplaced: boolean
  runsOf(text: string, weight: Weight): Run[]
}

interface CanvasOptions { title: string; keywords: string; subject: string; createdAt: string; language: Language }

/** A4 in points. */
export const PAGE = { width: 595.28, height: 841.89 }

/** Opens a tagged A4 document that flows into the stream; the same words at the same `createdAt` make the same bytes. */
export function openCanvas(options: CanvasOptions, stream: Writable): Canvas {
  const settings = {
    size: [PAGE.width, PAGE.height], margin: 0, pdfVersion: '1.7' as const, tagged: true, displayTitle: true,
    // No font of its own: the library's default one would stand in the file without being embedded.
    font: '',
    lang: options.language, autoFirstPage: false, bufferPages: true, subset: 'PDF/UA',
    info: {
      Title: options.title, Subject: options.subject, Keywords: options.keywords,
      Producer: 'Drenchleaf', Creator: 'Drenchleaf', CreationDate: new Date(options.createdAt),
    },
  }
  // The published types list PDF/A alone; the library knows PDF/UA.
  const known: Omit<PDFKit.PDFDocumentOptions, 'subset'> = settings
  const doc = new PDFDocument(known)
  doc.pipe(stream)
  doc.on('error', (error: Error) => stream.destroy(error))
  const root = doc.struct('Document')
  doc.addStructure(root)
  return { doc, root, hasReplaced: false, runsOf: rememberRuns(doc, openFonts()) }
}

function rememberRuns(doc: PDFKit.PDFDocument, fonts: Fonts): Canvas['runsOf'] {
  const known = new Map<string, Run[]>()
  const registered = new Set<string>()
  return (text, weight) => {
    const key = `${weight} ${text}`
    const runs = known.get(key) ?? splitRuns(text, weight, fonts)
    known.set(key, runs)
    for (const { face } of runs) {
      if (!registered.has(face)) doc.registerFont(face, fonts.open(face))
      registered.add(face)
    }
    return runs
  }
}

/** Draws something that readers by ear are to pass over: a rule, a running head. */
export function drawArtifact(canvas: Canvas, draw: () => void, kind: 'Layout' | 'Pagination' = 'Layout'): void {
  canvas.doc.markContent('Artifact', { type: kind })
  draw()
  canvas.doc.endMarkedContent()
}

/** Adds an element to the structure; with `draw`, what it draws is the element's content. */
export function addElement(
  canvas: Canvas, parent: Element, kind: string, draw?: () => void, options: PDFKit.Mixins.StructureElementOptions = {},
): Element {
  const element = canvas.doc.struct(kind, options)
  parent.add(element)
  if (draw) element.add(draw)
  return element
}
