import { verify } from 'otplib'
import type { EntityManager } from 'typeorm'
import { Account } from '../../entities/Account.ts'
import { AppError } from '../../errors.ts'
import type { Services } from '../services.ts'
import { spendRecoveryCode } from './recoveryCodes.ts'
import { openSecret } from './sealSecret.ts'

type Parts = Pick<Services, 'config' | 'clock' | 'database'>

/** A clock may be one step of 30 seconds off either way: people read a code, and walk to where they type it. */
const TOLERANCE_S = 30
const TOTP = /^\d{6}$/

/**
 * Asks for the second factor at a sign-in, where the account has one. A code is spent by being right.
 * @throws {AppError} `session.code_needed` without a code, `session.code_wrong` for a wrong or spent one, which counts as a guess.
 */
export async function assertSecondStep(services: Parts, accountId: string, code: string | undefined): Promise<void> {
  const account = await services.database.inHouse((manager) => manager.findOneByOrFail(Account, { id: accountId }))
  if (account.totpSecret === null) return
  if (code === undefined) throw new AppError('unauthenticated', 'session.code_needed')
  if (!(await spendCode(services, account, code))) throw new AppError('unauthenticated', 'session.code_wrong', { countsAsGuess: true })
}

/** Spends a code of the second factor, or a recovery code. @returns whether it was right and not spent before. */
export async function spendCode(services: Parts, account: Pick<Account, 'id' | 'totpSecret'>, typed: string): Promise<boolean> {
  const token = typed.replace(/\s/g, '')
  const step = TOTP.test(token) && account.totpSecret !== null ? await stepOf(services, account.id, account.totpSecret, token) : null
  return services.database.inHouse((manager) =>
    (step === null ? spendRecoveryCode(manager, account.id, typed, services.clock.now()) : spendStep(manager, account.id, step)))
}

/** The time step that a code is of, or null where it is of none near now. */
export async function stepOf({ config, clock }: Pick<Services, 'config' | 'clock'>, accountId: string, sealed: string, token: string): Promise<number | null> {
  const secret = openSecret(config.factorSecret, accountId, sealed)
  const result = await verify({ strategy: 'totp', secret, token, epoch: Math.floor(clock.now().getTime() / 1000), epochTolerance: TOLERANCE_S })
  return result.valid && 'timeStep' in result ? result.timeStep : null
}

/** Two that send one code at the same moment: the row is changed once. */
async function spendStep(manager: EntityManager, id: string, step: number): Promise<boolean> {
  const [, count]: [unknown, number] = await manager.query('UPDATE accounts SET totp_step = $2 WHERE id = $1 AND (totp_step IS NULL OR totp_step < $2)', [id, step])
  return count === 1
}
