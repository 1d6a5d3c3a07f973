import { expect, it } from 'vitest'
import { signedRecordSchema } from '../../../shared/contract/signedRecord.ts'
import { upgradeSigned } from '../../../shared/records/upgradeSigned.ts'
import { buildSignedRecord } from '../../support/buildSignedRecord.ts'

/** A text as the first schema wrote it: without what the second added. */
function buildFirst(): Parameters<typeof upgradeSigned>[0] {
  const { entry: _entry, replaces: _replaces, files: _files, ...signed } = buildSignedRecord()
  const { counts: _counts, totalKg: _totalKg, kgPerHa: _kgPerHa, sprayPerEach: _each, lines: _lines, air: _air, ...computed } = signed.computed
  const { workedInOn: _on, protection: _protection, licence: _licence, ...content } = signed.content
  const lines = content.lines.map(({ counts: _c, stage: _s, bbch: _b, ...line }) => line)
  const components = content.components.map(({ used: _used, basis, ...component }) =>
    ({ ...component, basis: basis.kind === 'ratio' ? { kind: basis.kind, parts: basis.parts } : basis }))
  return JSON.parse(JSON.stringify({ ...signed, schemaVersion: 1, computed, content: { ...content, lines, components } })) as never
}

it('reads the first schema as the second, with nothing said where nothing was', () => {
  const upgraded = upgradeSigned(buildFirst())
  expect(signedRecordSchema.parse(upgraded)).toEqual(upgraded)
  expect(upgraded).toMatchObject({
    schemaVersion: 2, entry: 'signed', replaces: null, files: [],
    content: { protection: [], licence: null, lines: [{ counts: {}, stage: null }, { counts: {} }], components: [{ used: null, basis: { reading: 'to' } }, { used: null }] },
    computed: { totalKg: null, lines: [], air: null },
  })
})

it('leaves the second as it is and refuses a later one', () => {
  const signed = buildSignedRecord()
  expect(upgradeSigned(signed)).toBe(signed)
  expect(() => upgradeSigned({ ...signed, schemaVersion: 3 as never })).toThrow(RangeError)
})
