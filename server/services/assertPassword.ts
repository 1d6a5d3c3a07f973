import type { FarmActor } from '../database/actor.ts'
import { AppError } from '../errors.ts'
import type { Services } from './services.ts'
import { isPasswordOf } from './signIn.ts'

/** Asks once more who it is, by password or PIN. @throws {AppError} `session.wrong_password` or `session.wrong_pin`, which count as a guess. */
export async function assertPassword(services: Services, actor: FarmActor, password: string): Promise<void> {
  if (await isPasswordOf(services, actor.accountId, password)) return
  const code = actor.signsWith === 'pin' ? 'session.wrong_pin' : 'session.wrong_password'
  throw new AppError('invalid-input', code, { countsAsGuess: true, errors: [{ path: 'password', code }] })
}
