import type { ChangeMe } from '../../../shared/contract/me.ts'
import type { Session } from '../../../shared/contract/session.ts'
import { Account } from '../../entities/Account.ts'
import { AppError, invalid, stale } from '../../errors.ts'
import { describeUser } from '../describeSession.ts'
import { tellOfPassword } from '../mail/tellOfPassword.ts'
import { assertFitPin } from '../people/setPin.ts'
import { assertGoodPassword, farmNames } from '../passwordRules.ts'
import { hashPassword, verifyPassword } from '../passwords.ts'
import type { Services } from '../services.ts'
import { endSessionsOf, type Who } from '../sessions/ownSessions.ts'
import { updateRow } from '../updateRow.ts'

/** Changes one's own name, language and preferences. @throws {AppError} `stale`. */
export async function changeMe(services: Services, accountId: string, { revision, name, language, preferences }: ChangeMe): Promise<Session['user']> {
  return services.database.inHouse(async (manager) => {
    const account = await manager.findOneOrFail(Account, { where: { id: accountId }, lock: { mode: 'pessimistic_write' } })
    if (account.revision !== revision) throw stale(describeUser(account))
    const changes = {
      name: name ?? account.name, language: language ?? account.language, preferences: { ...account.preferences, ...preferences }, revision: account.revision + 1,
    }
    await updateRow(manager, Account, { id: accountId }, changes)
    return describeUser({ ...account, ...changes })
  })
}

/**
 * Takes another password, or PIN, for the one that is asked once more; all other sessions end, and its e-mail is told.
 * @throws {AppError} `session.wrong_password`, `session.wrong_pin`, or what is not fit about the new one.
 */
export async function changePassword(services: Services, { accountId, sessionId }: Who, { password, newPassword }: { password: string; newPassword: string }): Promise<void> {
  const account = await services.database.inHouse((manager) => manager.findOneByOrFail(Account, { id: accountId }))
  if (!(await verifyPassword(account.passwordHash, password))) throw wrongSecret(account)
  if (account.kind === 'pin') assertPin(newPassword)
  else assertGoodPassword(newPassword, { path: 'newPassword', own: [account.email, account.name, ...(await farmNames(services, accountId))] })
  const passwordHash = await hashPassword(newPassword)
  await services.database.inHouse(async (manager) => {
    await updateRow(manager, Account, { id: accountId }, { passwordHash })
    await endSessionsOf(manager, accountId, sessionId)
    await tellOfPassword(services, manager, account)
  })
}

/** The refusal of a password or PIN that was asked once more. */
export function wrongSecret({ kind }: Pick<Account, 'kind'>): AppError {
  const code = kind === 'pin' ? 'session.wrong_pin' : 'session.wrong_password'
  return new AppError('invalid-input', code, { countsAsGuess: true, errors: [{ path: 'password', code }] })
}

function assertPin(pin: string): void {
  if (!/^\d{6}$/.test(pin)) throw invalid([{ path: 'newPassword', code: 'pin.format' }])
  assertFitPin(pin, 'newPassword')
}
