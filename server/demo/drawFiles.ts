import { buffer } from 'node:stream/consumers'
import PDFDocument from 'pdfkit'
import sharp from 'sharp'

/** Earth and leaf of one invented photo. */
export interface Scene {
  sky: string
  leaf: string
  soil: string
  /** Rows of plants between the foot and the horizon. */
  rows: number
}

const MORNING: Scene = { sky: '#cfe0ea', leaf: '#5d7f4a', soil: '#8a6b4c', rows: 7 }
const WIDTH = 1600
const HEIGHT = 1200
const HORIZON = 420

/** An invented photo of plant rows running away from the camera: JPEG, 1600 by 1200 pixels. */
export function drawPhoto(scene: Partial<Scene> = {}): Promise<Buffer> {
  return sharp(Buffer.from(svgOf({ ...MORNING, ...scene }))).jpeg({ quality: 80 }).toBuffer()
}

function svgOf({ sky, leaf, soil, rows }: Scene): string {
  const middle = WIDTH / 2
  const lines = Array.from({ length: rows }, (_, row) => {
    const foot = ((row + 0.5) / rows) * WIDTH * 1.8 - WIDTH * 0.4
    const far = middle + (foot - middle) * 0.12
    return `<path d="M${foot - 60} ${HEIGHT} L${far - 5} ${HORIZON} L${far + 5} ${HORIZON} L${foot + 60} ${HEIGHT}Z" fill="${leaf}"/>`
  })
  const hill = `<path d="M0 ${HORIZON} Q${middle * 0.6} ${HORIZON - 130} ${middle} ${HORIZON - 40} T${WIDTH} ${HORIZON - 70} V${HORIZON}Z" fill="${leaf}" opacity="0.5"/>`
  return `<svg xmlns="http://www.w3.org/2000/svg" width="${WIDTH}" height="${HEIGHT}">
    <rect width="100%" height="100%" fill="${sky}"/>${hill}<rect y="${HORIZON}" width="100%" height="100%" fill="${soil}"/>${lines.join('')}</svg>`
}

/** An invented paper of one page: PDF with a head and lines under it. */
export function drawPaper(head: string, lines: string[], at: Date): Promise<Buffer> {
  const page = new PDFDocument({ size: 'A5', margin: 40, info: { Title: head, CreationDate: at } })
  page.fontSize(16).text(head).moveDown().fontSize(11)
  for (const line of lines) page.text(line)
  page.end()
  return buffer(page)
}
