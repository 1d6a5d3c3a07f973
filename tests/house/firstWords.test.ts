import { existsSync, readFileSync } from 'node:fs'
import { dirname, relative, resolve } from 'node:path'
import { describe, expect, it } from 'vitest'
import { en } from '../../shared/messages/en.ts'
import { first } from '../../shared/messages/en/first.ts'
import { FIELD_PATH } from '../../vite/pieces.ts'

const IMPORT = /^(?:import|export)(?! type)[^'"]*?'(\.[^']+)'/gm
/** A whole id, or the beginning of one that is put together: what stands under it must all be there. */
const MESSAGE = /['`]([a-z]\w+(?:\.\w+)+)(?:['`]|\.\$\{)/g

describe('the words read first', () => {
  it('hold every message that is named on the way from sign-in to a new record', () => {
    const files = readOnTheWay()
    expect(files.size).toBeGreaterThan(250)
    const missing = [...files].flatMap(([file, source]) =>
      [...source.matchAll(MESSAGE)].flatMap(([, id = '']) => (find(en, id) !== undefined && !isIn(find(first, id), find(en, id)) ? [`${relative('.', file)}: ${id}`] : [])))
    expect(missing).toEqual([])
  })
})

function readOnTheWay(): Map<string, string> {
  const files = new Map<string, string>()
  const read = (file: string): void => {
    if (files.has(file) || file.includes('/shared/messages/e') || !existsSync(file)) return
    const source = readFileSync(file, 'utf8')
    files.set(file, source)
    for (const [, path = ''] of source.matchAll(IMPORT)) read(resolve(dirname(file), path))
  }
  for (const file of FIELD_PATH) read(resolve(file))
  return files
}

function find(words: object, id: string): unknown {
  return id.split('.').reduce<unknown>((found, name) => (typeof found === 'object' && found !== null ? Object.entries(found).find(([key]) => key === name)?.[1] : undefined), words)
}

/** Whether words hold all that others do. */
function isIn(words: unknown, whole: unknown): boolean {
  if (typeof whole !== 'object' || whole === null) return words === whole
  return typeof words === 'object' && words !== null && Object.entries(whole).every(([key, value]) => isIn(Object.entries(words).find(([name]) => name === key)?.[1], value))
}
