import { createHash, randomBytes } from 'node:crypto'
import { IsNull, type EntityManager } from 'typeorm'
import { RecoveryCode } from '../../entities/RecoveryCode.ts'

export const CODE_COUNT = 10
/** Letters and figures that are not mistaken for each other; 32 of them, 5 bits each. */
const ALPHABET = '0123456789ABCDEFGHJKMNPQRSTVWXYZ'
/** 24 signs are 120 bits: more than any list of guesses, so that a plain digest is enough. */
const SIGNS = 24
const GROUP = /.{4}/g

/** New recovery codes for an account; the ones before stop working. @returns them as they are shown, this once. */
export async function renewRecoveryCodes(manager: EntityManager, accountId: string, createdAt: Date): Promise<string[]> {
  await manager.update(RecoveryCode, { accountId, usedAt: IsNull() }, { usedAt: createdAt })
  const codes = Array.from({ length: CODE_COUNT }, () => [...randomBytes(SIGNS)].map((byte) => ALPHABET[byte % ALPHABET.length]).join(''))
  await manager.insert(RecoveryCode, codes.map((code) => ({ accountId, codeDigest: digestOf(code), createdAt, usedAt: null })))
  return codes.map((code) => code.match(GROUP)?.join('-') ?? code)
}

/** Spends a recovery code. @returns whether it was one that stood. */
export async function spendRecoveryCode(manager: EntityManager, accountId: string, typed: string, usedAt: Date): Promise<boolean> {
  const codeDigest = digestOf(fold(typed))
  const spent = await manager.update(RecoveryCode, { accountId, codeDigest, usedAt: IsNull() }, { usedAt })
  return spent.affected === 1
}

/** As it was given, whatever was typed between its groups; letters that look like figures are taken for them. */
function fold(typed: string): string {
  return typed.toUpperCase().replace(/[^0-9A-Z]/g, '').replace(/O/g, '0').replace(/[IL]/g, '1')
}

function digestOf(code: string): string {
  return createHash('sha256').update(code).digest('hex')
}
