import { existsSync, mkdirSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { describe, expect, it } from 'vitest'
import { OneLine } from '../../server/cli/lib/OneLine.mjs'
import { openDataFolder } from '../../server/cli/lib/dataFolder.mjs'
import { canEnter } from '../../server/cli/lib/databaseUser.mjs'
import { temporaryFolder } from './temporaryFolder.ts'

const folder = temporaryFolder()
const elsewhere = join(folder, 'elsewhere')

describe('openDataFolder', () => {
  it('makes a folder into which the database’s user can get', () => {
    const data = openDataFolder(join(folder, 'open', '.data'), elsewhere)
    expect(data.folder).toBe(join(folder, 'open', '.data'))
    expect(data.note).toBeUndefined()
    expect(canEnter(data.user, data.folder)).toBe(true)
  })

  it('finds the same place again under a folder closed to others', () => {
    const closed = join(folder, 'closed')
    mkdirSync(closed, { mode: 0o700 })
    const first = openDataFolder(join(closed, '.data'), elsewhere)
    expect(canEnter(first.user, first.folder)).toBe(true)
    expect(openDataFolder(join(closed, '.data'), elsewhere).folder).toBe(first.folder)
    expect(existsSync(join(closed, '.data'))).toBe(true)
  })

  it('says in one line that a file stands in its way', () => {
    const file = join(folder, 'file')
    writeFileSync(file, '')
    for (const wanted of [file, join(file, 'below')]) {
      expect(() => openDataFolder(wanted, elsewhere)).toThrow(new OneLine(`${wanted} cannot be made: a file stands in its way. Choose another folder with DATA_DIR.`))
    }
  })
})
