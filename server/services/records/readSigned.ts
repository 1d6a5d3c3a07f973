import type { SignedRecord } from '../../../shared/contract/signedRecord.ts'
import { sha256Hex } from '../../../shared/evidence/sha256Hex.ts'
import { upgradeSigned } from '../../../shared/records/upgradeSigned.ts'
import type { RecordVersion } from '../../entities/RecordVersion.ts'

/**
 * What was signed, out of its stored text. The digest vouches for it, not today's input rules: what an older contract took
 * stays readable.
 * @throws {Error} if the text does not agree with its digest, or is of a later schema than this program knows.
 */
export function readSigned({ canonicalText, digest, seq }: Pick<RecordVersion, 'canonicalText' | 'digest' | 'seq'>): SignedRecord {
  if (sha256Hex(canonicalText) !== digest) throw new Error(`Entry ${seq} does not agree with its digest`)
  return upgradeSigned(JSON.parse(canonicalText) as SignedRecord)
}
