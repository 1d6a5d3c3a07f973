import { mkdirSync, utimesSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { beforeAll, describe, expect, it } from 'vitest'
import { sourceStamp } from '../../server/cli/lib/sourceStamp.mjs'
import { temporaryFolder } from './temporaryFolder.ts'

const checkout = temporaryFolder()
const write = (name: string, text: string): void => writeFileSync(join(checkout, name), text)

beforeAll(() => {
  for (const folder of ['src/views', 'server/cli', 'shared', 'migrations', 'tests']) mkdirSync(join(checkout, folder), { recursive: true })
  write('index.html', '<main></main>')
  write('package-lock.json', '{}')
  write('server/main.ts', 'export {}')
})

describe('sourceStamp', () => {
  it.each([
    ['a changed source', 'server/main.ts', 'export const a = 1'],
    ['a new source', 'src/views/New.vue', '<template/>'],
    ['other packages', 'package-lock.json', '{"packages":{}}'],
    ['other compiler settings', 'tsconfig.build.json', '{}'],
  ])('changes with %s', (_, name, text) => {
    const before = sourceStamp(checkout)
    write(name, text)
    expect(sourceStamp(checkout)).not.toBe(before)
  })

  it.each([
    ['a test', 'tests/some.test.ts'],
    ['a command that is not built', 'server/cli/start.mjs'],
  ])('stays with %s', (_, name) => {
    const before = sourceStamp(checkout)
    write(name, 'anything')
    expect(sourceStamp(checkout)).toBe(before)
  })

  it('stays when only dates change', () => {
    const before = sourceStamp(checkout)
    utimesSync(join(checkout, 'server/main.ts'), new Date(0), new Date(0))
    expect(sourceStamp(checkout)).toBe(before)
  })
})
