import { mkdirSync, statSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { describe, expect, it } from 'vitest'
import { OneLine } from '../../server/cli/lib/OneLine.mjs'
import { makeSecrets, secretsOf } from '../../server/cli/lib/secrets.mjs'
import { temporaryFolder } from './temporaryFolder.ts'

const folder = temporaryFolder()

const fresh = (name: string): string => {
  const path = join(folder, name)
  mkdirSync(path)
  return path
}

describe('secretsOf', () => {
  it('makes them once and gives the same ever after, open to the owner alone', () => {
    const data = fresh('once')
    const first = secretsOf(data)
    expect(secretsOf(data)).toEqual(first)
    expect(statSync(join(data, 'secrets.json')).mode & 0o777).toBe(0o600)
  })

  it('differ from folder to folder', () => {
    expect(secretsOf(fresh('one'))).not.toEqual(secretsOf(fresh('other')))
  })

  it('are not made anew beside a database that has the old ones', () => {
    const data = fresh('lost')
    mkdirSync(join(data, 'postgres'))
    expect(() => secretsOf(data)).toThrow(OneLine)
  })

  it.each(['', '{', '{}', '{"ownerPassword":"x"}', 'null'])('are refused where the file holds "%s"', (text) => {
    const data = fresh(`torn-${Buffer.from(text).toString('hex')}`)
    writeFileSync(join(data, 'secrets.json'), text)
    expect(() => secretsOf(data)).toThrow(OneLine)
  })
})

describe('makeSecrets', () => {
  it('makes a session secret of 256 bits and a password one can read out', () => {
    const { sessionSecret, demoPassword } = makeSecrets()
    expect(sessionSecret).toMatch(/^[0-9a-f]{64}$/)
    expect(demoPassword).toMatch(/^[a-hjkmnp-z2-9]{4}(-[a-hjkmnp-z2-9]{4}){2}$/)
  })
})
