import type { Writable } from 'node:stream'
import PDFDocument from 'pdfkit'
import type { Language } from '../../../shared/messages/translate.ts'
import type { Weight } from './fontFiles.ts'
import { openFonts, type Fonts } from './openFonts.ts'
import { PAPERS, type Paper } from './paper.ts'
import { splitRuns, type Run } from './splitRuns.ts'

export type Element = PDFKit.PDFStructureElement
/** How words are set; size and leading in points. */
export interface TextStyle { size: number; leading: number; weight: Weight; color: string }

/** One PDF being made: the document, its fonts, its structure. */
export interface Canvas {
  doc: PDFKit.PDFDocument
  /** That of the page being drawn. */
  frame: Frame
  root: Element
  /** True once a letter had to be drawn as a box. */
  hasReplaced: boolean
  runsOf(text: string, weight: Weight): Run[]
}

/** The edges that the text keeps to, and the running head and the page's foot, points from the page's top left. */
export interface Frame { left: number; right: number; top: number; bottom: number; width: number }

interface CanvasOptions {
  title: string; keywords: string; subject: string; createdAt: string; language: Language
  /** The page lies on its long side. */
  isLying?: boolean
  /** A4 unless said. */
  paper?: Paper
}

/** A4 in points. */
export const PAGE = PAPERS.a4
const MM = 72 / 25.4

/** The frame of a page of that size: 16 mm left, 14 mm right, 12 mm above and below. */
export function frameOf({ width, height }: { width: number; height: number }): Frame {
  const [left, right] = [16 * MM, width - 14 * MM]
  return { left, right, top: 12 * MM, bottom: height - 12 * MM, width: right - left }
}

/** Opens a tagged document that flows into the stream; the same words at the same `createdAt` make the same bytes. */
export function openCanvas(options: CanvasOptions, stream: Writable): Canvas {
  const upright = PAPERS[options.paper ?? 'a4']
  const size = options.isLying ? { width: upright.height, height: upright.width } : upright
  const settings = {
    size: [size.width, size.height], margin: 0, pdfVersion: '1.7' as const, tagged: true, displayTitle: true,
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
  return { doc, root, frame: frameOf(size), hasReplaced: false, runsOf: rememberRuns(doc, openFonts()) }
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
