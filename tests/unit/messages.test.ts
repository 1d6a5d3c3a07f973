import { execFileSync } from 'node:child_process'
import { readFileSync } from 'node:fs'
import type { MessageContext } from '@intlify/core-base'
import { describe, expect, it } from 'vitest'
import { compileWords } from '../../shared/messages/compileWords.ts'
import { renderMessage } from '../../shared/messages/renderMessage.ts'
import { translate } from '../../shared/messages/translate.ts'

describe('translate', () => {
  it('speaks both languages', () => {
    expect(translate('en', 'problems.not_found')).toBe('Nothing here under that number.')
    expect(translate('es', 'problems.not_found')).toBe('No hay nada aquí con ese número.')
  })

  it('knows no language that it was not taught', () => {
    expect(() => translate('fr' as 'en', 'problems.not_found')).toThrow(RangeError)
  })

  it('refuses a message that is not there', () => {
    expect(() => translate('en', 'problems.not_there')).toThrow(RangeError)
  })
})

describe('renderMessage', () => {
  it('gives numbers the marks of the language and leaves text alone', () => {
    const message = { id: 'problems.lot.short', params: { code: '26-018', left: 1234.5, needed: 2000, unit: 'L' } }
    expect(renderMessage('en', message)).toContain('26-018 has 1\u00a0234.5')
    expect(renderMessage('es', message)).toContain('1\u00a0234,5')
  })

  it('gives them to a difference, too, and keeps its sign', () => {
    const percent = (value: string) => renderMessage('es', { id: 'checks.figure.percent', params: { value } })
    expect(['+22.4', '-9.8', '0'].map(percent)).toEqual(['+22,4\u00a0%', '-9,8\u00a0%', '0\u00a0%'])
  })
})

describe('counts', () => {
  it.each([
    ['en', 1, '1 block, 0.94 ha'], ['en', 24, '24 blocks, 0.94 ha'], ['en', 0, '0 blocks, 0.94 ha'], ['es', 1, '1 parcela, 0.94 ha'], ['es', 2, '2 parcelas, 0.94 ha'],
  ] as const)('in %s, %d: %s', (language, count, words) => {
    expect(renderMessage(language, { id: 'blocks.count', params: { count, area: '0.94' } })).toBe(words)
    expect(translate(language, 'blocks.count', { count, area: '0.94', areaUnit: 'ha' })).toBe(words)
  })
})

describe('refusals', () => {
  it('have words for every code that the server or the shared checks can give', () => {
    const files = execFileSync('git', ['ls-files', 'server', 'shared'], { encoding: 'utf8' }).trim().split('\n').filter((file) => file.endsWith('.ts') && !/\/(messages|checks|mix)\/|parsePoint/.test(file))
    const codes = new Set<string>()
    for (const file of files) {
      const text = readFileSync(file, 'utf8')
      for (const match of text.matchAll(/(?:error|code): '((?:[a-z_]+\.)+[a-z_]+)'/g)) if (match[1]) codes.add(match[1])
    }
    expect(codes.size).toBeGreaterThan(40)
    const wordless = [...codes].filter((code) => {
      try {
        translate('en', `problems.${code}`)
        translate('es', `problems.${code}`)
        return false
      } catch {
        return true
      }
    })
    expect(wordless).toEqual([])
  })
})

describe('compileWords', () => {
  const context = (type: string, params: Record<string, unknown>, chosen = 0) => ({
    type, values: params, named: (name: string) => params[name], plural: <Form>(forms: Form[]) => forms[chosen],
  }) as unknown as MessageContext
  const at = { locale: 'en', key: '', onCacheKey: (text: string) => text }

  it('puts parameters where they stand, and nothing where one is missing', () => {
    const ready = compileWords('{first} and {last}.', at)
    expect(ready(context('text', { first: 'V1', last: 2 }))).toBe('V1 and 2.')
    expect(ready(context('text', { first: 'V1' }))).toBe('V1 and .')
  })

  it('leaves what is in a parameter as it is', () => {
    expect(compileWords('Of {name}', at)(context('text', { name: '{other} | @:x' }))).toBe('Of {other} | @:x')
  })

  it('chooses the form for one or several', () => {
    const ready = compileWords('{number} lot | {number} lots', at)
    expect(ready(context('text', { number: 1 }, 0))).toBe('1 lot')
    expect(ready(context('text', { number: 4 }, 1))).toBe('4 lots')
  })

  it('keeps the pieces apart for a component that puts elements between words', () => {
    expect(compileWords('{figure} waits', at)(context('vnode', { figure: ['b'] }))).toEqual(['', ['b'], ' waits'])
  })
})
