import { execFileSync } from 'node:child_process'
import jsqr from 'jsqr'

/** Dots a drawn module at least: the reader works on the picture, as a camera would. */
const DPI = 300
const PAGE_AREA = { width: 700, height: 700 }

/** What the QR code at the lower left of a PDF's first page says, and whether four modules around it are white. */
export function readQr(bytes: Buffer): { text: string | null; isQuiet: boolean } {
  const picture = readGrey(execFileSync('pdftoppm', ['-gray', '-r', String(DPI), '-f', '1', '-l', '1', '-'], { input: bytes, maxBuffer: 1 << 28 }))
  const { width, height, at } = picture
  const [left, top] = [0, height - PAGE_AREA.height]
  const rgba = new Uint8ClampedArray(PAGE_AREA.width * PAGE_AREA.height * 4)
  for (let y = 0; y < PAGE_AREA.height; y += 1) {
    for (let x = 0; x < PAGE_AREA.width; x += 1) rgba.set([at(left + x, top + y), at(left + x, top + y), at(left + x, top + y), 255], (y * PAGE_AREA.width + x) * 4)
  }
  const found = jsqr(rgba, PAGE_AREA.width, PAGE_AREA.height)
  if (found === null || width < PAGE_AREA.width) return { text: null, isQuiet: false }
  const { topLeftCorner: from, bottomRightCorner: to } = found.location
  const quiet = (4 * (to.x - from.x)) / (17 + 4 * found.version)
  const isDark = (x: number, y: number) => at(Math.round(left + x), Math.round(top + y)) < 128
  const isQuiet = [...Array(Math.ceil(to.x - from.x + 2 * quiet)).keys()].every((step) => {
    const along = from.x - quiet + step
    const down = from.y - quiet + step
    const rings = [1.5, quiet / 2, quiet - 1]
    return rings.every((off) => !isDark(along, from.y - off) && !isDark(along, to.y + off) && !isDark(from.x - off, down) && !isDark(to.x + off, down))
  })
  return { text: found.data, isQuiet }
}

/** Reads a binary grey picture (PGM, 8 bits). */
function readGrey(file: Buffer): { width: number; height: number; at: (x: number, y: number) => number } {
  const head = /^P5\s+(\d+)\s+(\d+)\s+255\s/.exec(file.subarray(0, 60).toString('latin1'))
  if (head === null) throw new Error('No grey picture')
  const [width, height, from] = [Number(head[1]), Number(head[2]), head[0].length]
  return { width, height, at: (x, y) => file[from + y * width + x] ?? 255 }
}
