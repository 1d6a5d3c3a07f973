import type { CheckCodeAnswer } from '../../shared/contract/record.ts'
import { parseCheckCode } from '../../shared/evidence/checkCode.ts'
import type { Services } from './services.ts'

interface Found {
  number: string
  seq: number
  version: number
  signed_at: Date
  digest: string
  latest: number
  withdrawn: boolean
}

/** What an outsider learns from a check code: whether such an entry stands, its number and its day; nothing it says. */
export async function findCheckCode(services: Services, text: string): Promise<CheckCodeAnswer> {
  const code = parseCheckCode(text)
  const rows: Found[] = code === null ? [] : await services.database.inHouse((manager) => manager.query('SELECT * FROM find_check_code($1)', [code]))
  const [found] = rows
  if (!found) return { found: false, number: null, seq: null, version: null, signedAt: null, digest: null, latestVersion: null, withdrawn: null }
  return { found: true, number: found.number, seq: found.seq, version: found.version, signedAt: found.signed_at.toISOString(), digest: found.digest, latestVersion: found.latest, withdrawn: found.withdrawn }
}
