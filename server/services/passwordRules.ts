import { invalid } from '../errors.ts'
import { COMMON_PASSWORDS } from './commonPasswords.ts'
import type { Services } from './services.ts'

const SHORTEST = 12
/** What a password must still have when the words that anybody would try here are cut out of it. */
const SHORTEST_REST = 8
/** Words of this house; shorter ones are not cut, they stand in too many others. */
const HOUSE_WORDS = ['drenchleaf', 'register', 'password', 'contraseña', 'owner', 'manager', 'applicator', 'certifier', 'titular', 'responsable', 'aplicador']
const SHORTEST_WORD = 4

/**
 * Refuses a new password that is short, known, or made of the house's and the account's own words; it is otherwise taken as typed.
 * @param own what belongs to the account: its e-mail, its name, the names of its farms.
 * @throws {AppError} `welcome.password_short`, `welcome.password_known`.
 */
export function assertGoodPassword(password: string, { path = 'password', own = [] }: { path?: string; own?: readonly (string | null)[] } = {}): void {
  if ([...password].length < SHORTEST) throw invalid([{ path, code: 'welcome.password_short' }])
  const folded = password.toLowerCase()
  const words = [...HOUSE_WORDS, ...own.flatMap((text) => (text ?? '').toLowerCase().split(/[^\p{L}\p{N}]+/u)).filter((word) => word.length >= SHORTEST_WORD)]
  const rest = words.reduce((text, word) => text.replaceAll(word, ''), folded)
  if (COMMON_PASSWORDS.has(folded) || [...rest].length < SHORTEST_REST) throw invalid([{ path, code: 'welcome.password_known' }])
}

/** The names of the farms that are open to an account: words that anybody there would try. */
export async function farmNames({ database, clock }: Pick<Services, 'database' | 'clock'>, accountId: string): Promise<string[]> {
  return (await database.listAccess(accountId, clock.now())).map(({ farmName }) => farmName)
}
