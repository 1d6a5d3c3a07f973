import { readFileSync } from 'node:fs'
import { createRequire } from 'node:module'
import { create, type Font } from 'fontkit'
import { fallbackFiles, plainFiles, type FontFile, type Weight } from './fontFiles.ts'
import { unpackWoff } from './unpackWoff.ts'

interface ReadFont { bytes: Buffer; codePoints: Set<number> }
const read = new Map<string, ReadFont>()
const { resolve } = createRequire(import.meta.url)

/** The fonts of one document, by face ("bold-latin"). */
export interface Fonts {
  /** The face of Noto Sans that holds every one of the characters, or null. */
  findFace(weight: Weight, characters: string): string | null
  /** The same among the fonts of other alphabets. */
  findFallback(weight: Weight, characters: string): string | null
  /** Whether the font library can lay the letters out: over rare marks it trips. */
  canSet(face: string, letters: string): boolean
  /** Opens a face that was found, for this document; the second time it is the same Font. */
  open(face: string): Font
}

/**
 * Files are read once a process, but opened once a document: an opened font remembers which characters its glyphs were
 * first asked for, so that sharing it would let one document change the text that another one yields.
 */
export function openFonts(): Fonts {
  const opened = new Map<string, Font>()
  const open = (face: string): Font => {
    const known = opened.get(face) ?? create(bytesOf(face))
    opened.set(face, known)
    return known
  }
  return {
    open,
    findFace: (weight, characters) => findIn(plainFiles(weight), characters),
    findFallback: (weight, characters) => findIn(fallbackFiles(weight), characters),
    canSet(face, letters) {
      try {
        open(face).layout(letters)
        return true
      } catch {
        // Its only answer is to throw.
        return false
      }
    },
  }
}

function findIn(files: FontFile[], characters: string): string | null {
  const wanted = Array.from(characters, (character) => character.codePointAt(0) ?? 0)
  return files.find((file) => wanted.every((point) => readFont(file).codePoints.has(point)))?.face ?? null
}

function readFont({ face, path }: FontFile): ReadFont {
  const known = read.get(face)
  if (known) return known
  const bytes = unpackWoff(readFileSync(resolve(path)))
  const font = { bytes, codePoints: new Set(create(bytes).characterSet) }
  read.set(face, font)
  return font
}

function bytesOf(face: string): Buffer {
  const font = read.get(face)
  if (!font) throw new Error(`Nobody found the face ${face}`)
  return font.bytes
}
