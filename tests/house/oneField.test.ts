import { execFileSync } from 'node:child_process'
import { readFileSync } from 'node:fs'
import { expect, it } from 'vitest'

/** Files outside tests that DEVELOPERS.md lists under "How to add a field". */
const MOST = 6

it('names one plain field of the record in at most six files, the ones DEVELOPERS.md lists', () => {
  const files = execFileSync('git', ['ls-files', 'src', 'server', 'shared', 'migrations'], { encoding: 'utf8' }).trim().split('\n')
  const naming = files.filter((file) => !file.startsWith('server/demo/') && /\bpurpose\b/.test(readFileSync(file, 'utf8')))
  const chapter = readFileSync('DEVELOPERS.md', 'utf8').split('## How to add a field')[1]?.split('\n## ')[0] ?? ''
  expect(naming.length).toBeGreaterThan(1)
  expect(naming.length).toBeLessThanOrEqual(MOST)
  for (const file of naming) expect(chapter).toContain(file)
})
