import { describe, expect, it } from 'vitest'
import { arePackagesCurrent } from '../../server/cli/lib/packages.mjs'

const lock = {
  packages: {
    '': { version: '0.1.0' },
    'node_modules/a': { version: '1.0.0', integrity: 'sha512-a' },
    'node_modules/b-linux': { version: '1.0.0', integrity: 'sha512-l', optional: true, os: ['linux'] },
    'node_modules/b-darwin': { version: '1.0.0', integrity: 'sha512-d', optional: true, os: ['darwin'] },
  },
}
const { 'node_modules/a': a, 'node_modules/b-linux': linux } = lock.packages
const installed = { 'node_modules/a': a, 'node_modules/b-linux': linux }

describe('arePackagesCurrent', () => {
  it('holds where all but another system’s packages are there', () => {
    expect(arePackagesCurrent(lock, { packages: installed })).toBe(true)
  })

  it.each([
    ['nothing is there', {}],
    ['one is missing', { 'node_modules/b-linux': linux }],
    ['one has another version', { ...installed, 'node_modules/a': { ...a, version: '1.0.1' } }],
    ['one has other contents', { ...installed, 'node_modules/a': { ...a, integrity: 'sha512-x' } }],
    ['one is too many', { ...installed, 'node_modules/c': { version: '1.0.0' } }],
  ])('does not hold where %s', (_, packages) => {
    expect(arePackagesCurrent(lock, { packages })).toBe(false)
  })
})
