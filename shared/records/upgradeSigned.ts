import type { SignedRecord } from '../contract/signedRecord.ts'
import { BLANK_COMPUTED, BLANK_LOADS, fillContent } from './fillStored.ts'

/** Signed text of the first schema: what the second one added is not in it. */
type FirstSigned = Omit<SignedRecord, 'schemaVersion' | 'entry' | 'replaces' | 'files'> & { schemaVersion: 1 }

/**
 * A signed text of any schema that was ever written, with what it lacks filled in as "not said".
 * @throws {RangeError} if it is of a later schema than this program knows.
 */
export function upgradeSigned(signed: SignedRecord | FirstSigned): SignedRecord {
  if (signed.schemaVersion === 2) return signed
  if (signed.schemaVersion !== 1) throw new RangeError(`signed text of schema ${String((signed as { schemaVersion: unknown }).schemaVersion)}`)
  const { computed, sprayer } = signed
  return {
    ...signed,
    schemaVersion: 2,
    entry: 'signed',
    replaces: null,
    files: [],
    content: fillContent(signed.content),
    computed: { ...BLANK_COMPUTED, ...computed, loads: computed.loads && { ...BLANK_LOADS, ...computed.loads } },
    sprayer: sprayer && { ...{ flowLPerMin: null }, ...sprayer },
  }
}
