import { generateSecret, generateURI } from 'otplib'
import { toString as drawQr } from 'qrcode'
import { IsNull, type EntityManager } from 'typeorm'
import type { FactorOffer, FactorState } from '../../../shared/contract/me.ts'
import { Account } from '../../entities/Account.ts'
import { RecoveryCode } from '../../entities/RecoveryCode.ts'
import { AppError, invalid } from '../../errors.ts'
import { tellOfFactor } from '../mail/tellOfFactor.ts'
import { wrongSecret } from '../me/changeMe.ts'
import { verifyPassword } from '../passwords.ts'
import type { Services } from '../services.ts'
import { endSessionsOf, type Who } from '../sessions/ownSessions.ts'
import { updateRow } from '../updateRow.ts'
import { spendCode, stepOf } from './assertSecondStep.ts'
import { renewRecoveryCodes } from './recoveryCodes.ts'
import { sealSecret } from './sealSecret.ts'

const ISSUER = 'Drenchleaf'
/** 160 bits, as RFC 4226 (section 4, R6) recommends. */
const SECRET_BYTES = 20

/** Since when there is a second factor, and how many recovery codes are left. */
export async function readFactor(services: Services, accountId: string): Promise<FactorState> {
  return services.database.inHouse(async (manager) => {
    const account = await manager.findOneByOrFail(Account, { id: accountId })
    const codesLeft = account.totpSecret === null ? 0 : await manager.countBy(RecoveryCode, { accountId, usedAt: IsNull() })
    return { since: account.totpSince?.toISOString() ?? null, codesLeft }
  })
}

/**
 * Offers a secret for an authenticator. Nothing changes until a code of it was given; who has a factor proves it first.
 * @throws {AppError} `session.wrong_password`, `factor.wrong`.
 */
export async function beginFactor(services: Services, accountId: string, proof: { password: string; code?: string | undefined }): Promise<FactorOffer> {
  const account = await prove(services, accountId, proof)
  const secret = generateSecret({ length: SECRET_BYTES })
  await services.database.inHouse((manager) => updateRow(manager, Account, { id: accountId }, { totpPending: sealSecret(services.config.factorSecret, accountId, secret) }))
  const uri = generateURI({ issuer: ISSUER, label: account.email ?? account.name, secret })
  const drawing = await drawQr(uri, { type: 'svg', margin: 2 })
  return { secret, picture: `data:image/svg+xml;base64,${Buffer.from(drawing).toString('base64')}` }
}

/**
 * Takes the offered secret on, proved by a code of it; all other sessions end.
 * @returns new recovery codes, shown this once. @throws {AppError} `factor.begin`, `factor.wrong`.
 */
export async function confirmFactor(services: Services, { accountId, sessionId }: Who, code: string): Promise<string[]> {
  const account = await services.database.inHouse((manager) => manager.findOneByOrFail(Account, { id: accountId }))
  if (account.totpPending === null) throw invalid([{ path: 'code', code: 'factor.begin' }])
  const step = await stepOf(services, accountId, account.totpPending, code.replace(/\s/g, ''))
  if (step === null) throw wrongCode()
  const now = services.clock.now()
  return services.database.inHouse(async (manager) => {
    await updateRow(manager, Account, { id: accountId }, { totpSecret: account.totpPending, totpPending: null, totpStep: step, totpSince: now })
    await endSessionsOf(manager, accountId, sessionId)
    // Password and code were just asked: the shorter session that a factor brings counts from here.
    await manager.query('UPDATE sessions SET opened_at = $2, seen_at = $2 WHERE id = $1', [sessionId, now])
    await tellOfFactor(services, manager, { accountId, news: 'set' })
    return renewRecoveryCodes(manager, accountId, now)
  })
}

/** Takes the second factor away; all other sessions end. @throws {AppError} `session.wrong_password`, `factor.none`, `factor.wrong`. */
export async function removeFactor(services: Services, { accountId, sessionId }: Who, proof: { password: string; code: string }): Promise<void> {
  await proveFactor(services, accountId, proof)
  await services.database.inHouse(async (manager) => {
    await dropFactor(manager, accountId, services.clock.now())
    await endSessionsOf(manager, accountId, sessionId)
    await tellOfFactor(services, manager, { accountId, news: 'removed' })
  })
}

/** New recovery codes for the ones before. @throws {AppError} as `removeFactor`. */
export async function renewCodes(services: Services, accountId: string, proof: { password: string; code: string }): Promise<string[]> {
  await proveFactor(services, accountId, proof)
  return services.database.inHouse(async (manager) => {
    await tellOfFactor(services, manager, { accountId, news: 'codes' })
    return renewRecoveryCodes(manager, accountId, services.clock.now())
  })
}

/** Leaves nothing of a second factor on an account. */
export async function dropFactor(manager: EntityManager, accountId: string, usedAt: Date): Promise<void> {
  await updateRow(manager, Account, { id: accountId }, { totpSecret: null, totpPending: null, totpStep: null, totpSince: null })
  await manager.update(RecoveryCode, { accountId, usedAt: IsNull() }, { usedAt })
}

async function proveFactor(services: Services, accountId: string, proof: { password: string; code: string }): Promise<void> {
  const { totpSecret } = await prove(services, accountId, proof)
  if (totpSecret === null) throw invalid([{ path: 'code', code: 'factor.none' }])
}

/** Asks the password once more, and a code where there is a factor. */
async function prove(services: Services, accountId: string, { password, code }: { password: string; code?: string | undefined }): Promise<Account> {
  const account = await services.database.inHouse((manager) => manager.findOneByOrFail(Account, { id: accountId }))
  if (!(await verifyPassword(account.passwordHash, password))) throw wrongSecret(account)
  if (account.totpSecret !== null && (code === undefined || !(await spendCode(services, account, code)))) throw wrongCode()
  return account
}

function wrongCode(): AppError {
  return new AppError('invalid-input', 'factor.wrong', { countsAsGuess: true, errors: [{ path: 'code', code: 'factor.wrong' }] })
}
