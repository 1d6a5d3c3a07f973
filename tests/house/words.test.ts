import { execFileSync } from 'node:child_process'
import { readFileSync } from 'node:fs'
import { describe, expect, it } from 'vitest'
import { en } from '../../shared/messages/en.ts'
import { es } from '../../shared/messages/es.ts'

type Tree = { [key: string]: string | Tree }

function leaves(tree: Tree, path = ''): [string, string][] {
  return Object.entries(tree).flatMap(([key, value]): [string, string][] =>
    typeof value === 'string' ? [[`${path}${key}`, value]] : leaves(value, `${path}${key}.`))
}

const english = leaves(en)
const spanish = new Map(leaves(es))

describe('messages', () => {
  it.each(english)('%s takes the same parameters in both languages', (id, words) => {
    const params = (text: string) => [...new Set([...text.matchAll(/\{(\w+)\}/g)].map((match) => match[1]))].sort()
    expect(params(spanish.get(id) ?? '')).toEqual(params(words))
  })

  it('promise nothing that the product cannot know, and do not beg or praise', () => {
    const forbidden = /\b(safe|safely|compliant|compliance|please|successfully|oops|seguro que cumple|por favor|exitosamente)\b/i
    const found = [...english, ...spanish].filter(([, words]) => forbidden.test(words) || /[!¡]/.test(words))
    expect(found).toEqual([])
  })

  it('say one and several apart where a count stands before what is counted', () => {
    // Words that stay as they are whatever the count, and messages of several alone.
    const counted = /\{count\} (?!(?:not|kept|more|begun|min|of|por|sin|más|de)\b)\p{L}{3,}/u
    const oneForm = [...english, ...spanish].filter(([id, words]) => counted.test(words) && !words.includes(' | ') && !/many/i.test(id))
    expect(oneForm).toEqual([])
    expect(english.filter(([, words]) => counted.test(words)).length).toBeGreaterThan(10)
  })

  it('use only marks that the font has', () => {
    const missing = /[≥≤→←↑↓≈✓✕■●◆⅓⅔⅛₂\u202F]/
    expect([...english, ...spanish].filter(([, words]) => missing.test(words))).toEqual([])
  })
})

describe('code and interface', () => {
  const files = execFileSync('git', ['ls-files', 'src', 'server', 'shared', 'migrations'], { encoding: 'utf8' }).trim().split('\n').filter((file) => /\.(ts|vue)$/.test(file))

  it('use the words of the product, not their old or foreign names', () => {
    const old = /\b(void(ed)?Record|sprayEvent|paddock|treatment(s|Record)?|logEntry|sprayLog|tankMix)\b/
    expect(files.filter((file) => old.test(readFileSync(file, 'utf8')))).toEqual([])
  })

  it('ask only for messages that exist', () => {
    const known = new Set(english.map(([id]) => id))
    const asked = files.flatMap((file) =>
      [...readFileSync(file, 'utf8').matchAll(/\bt\(\s*'([\w.]+)'/g)].map((match) => ({ file, id: match[1] ?? '' })))
    expect(asked.length).toBeGreaterThan(50)
    expect(asked.filter(({ id }) => !known.has(id))).toEqual([])
  })
})
