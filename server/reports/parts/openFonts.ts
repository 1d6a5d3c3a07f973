import { readFileSync } from 'node:fs'
import { createRequire } from 'node:module'
import { create, type Font } from 'fontkit'
import { unpackWoff } from './unpackWoff.ts'

export type Weight = 'regular' | 'semibold' | 'bold' | 'black' | 'italic'

/** In the order in which they are asked for a letter. */
const SUBSETS = ['latin', 'latin-ext', 'greek', 'cyrillic', 'vietnamese', 'greek-ext', 'cyrillic-ext'] as const
const FILES: Record<Weight, string> = {
  regular: '400-normal', semibold: '600-normal', bold: '700-normal', black: '800-normal', italic: '400-italic',
}

interface FontFile { bytes: Buffer; codePoints: Set<number> }
const files = new Map<string, FontFile>()
const { resolve } = createRequire(import.meta.url)

/** The fonts of one document, by face ("bold-latin"). */
export interface Fonts {
  /** The face that holds every one of the characters, or null. */
  findFace(weight: Weight, characters: string): string | null
  /** Opens a face for this document; the second time it is the same Font. */
  open(face: string): Font
}

/**
 * Files are read once a process, but opened once a document: an opened font remembers which characters its glyphs were
 * first asked for, so that sharing it would let one document change the text that another one yields.
 */
export function openFonts(): Fonts {
  const opened = new Map<string, Font>()
  return {
    findFace(weight, characters) {
      const wanted = Array.from(characters, (character) => character.codePointAt(0) ?? 0)
      const subset = SUBSETS.find((name) => wanted.every((point) => readFont(`${weight}-${name}`).codePoints.has(point)))
      return subset === undefined ? null : `${weight}-${subset}`
    },
    open(face) {
      const font = opened.get(face) ?? create(readFont(face).bytes)
      opened.set(face, font)
      return font
    },
  }
}

function readFont(face: string): FontFile {
  const known = files.get(face)
  if (known) return known
  const [weight = '', ...subset] = face.split('-')
  const path = resolve(`@fontsource/noto-sans/files/noto-sans-${subset.join('-')}-${FILES[weight as Weight]}.woff`)
  const bytes = unpackWoff(readFileSync(path))
  const file = { bytes, codePoints: new Set(create(bytes).characterSet) }
  files.set(face, file)
  return file
}
