import type { CheckCodeAnswer } from '../../shared/contract/record.ts'
import { parseCheckCode } from '../../shared/evidence/checkCode.ts'
import { readSeasonHead } from './season/readSeasonHead.ts'
import type { Services } from './services.ts'

interface FoundEntry {
  number: string
  seq: number
  version: number
  signed_at: Date
  digest: string
  latest: number
  withdrawn: boolean
}
interface FoundHead { farm_id: string; season: number; seq: number; digest: string; taken_at: Date }

const NOTHING: CheckCodeAnswer = { found: false, number: null, seq: null, version: null, signedAt: null, digest: null, latestVersion: null, withdrawn: null, season: null }

/** What an outsider learns from a check code: whether such an entry or season report stands, its number and its day; nothing it says. */
export async function findCheckCode(services: Services, text: string): Promise<CheckCodeAnswer> {
  const code = parseCheckCode(text)
  if (code === null) return NOTHING
  const [found]: FoundEntry[] = await services.database.askHouse('SELECT * FROM find_check_code($1)', [code])
  if (!found) return findSeasonCode(services, code)
  const { number, seq, version, signed_at: signedAt, digest, latest, withdrawn } = found
  return { ...NOTHING, found: true, number, seq, version, signedAt: signedAt.toISOString(), digest, latestVersion: latest, withdrawn }
}

/** The same for the code of a season report, worked out anew from the signed texts. */
async function findSeasonCode(services: Services, code: string): Promise<CheckCodeAnswer> {
  const [found]: FoundHead[] = await services.database.askHouse('SELECT * FROM find_season_code($1)', [code])
  if (!found) return NOTHING
  const { farm_id: farmId, season, seq, digest, taken_at: takenAt } = found
  const [then, now] = await services.database.inFarm({ farmId, seasons: [season] }, async (manager) => [
    await readSeasonHead(manager, { farmId }, season, seq), await readSeasonHead(manager, { farmId }, season),
  ])
  const agrees = then?.digest === digest
  return { ...NOTHING, found: agrees, seq, digest, season: { season, seq, takenAt: takenAt.toISOString(), agrees, wentOn: now !== null && now.seq > seq } }
}
