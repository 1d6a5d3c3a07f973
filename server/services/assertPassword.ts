import type { FarmActor } from '../database/actor.ts'
import { AppError } from '../errors.ts'
import type { Services } from './services.ts'
import { isPasswordOf } from './signIn.ts'

/** Asks once more who signs. @throws {AppError} `session.wrong_password`, which counts as a guess. */
export async function assertPassword(services: Services, actor: FarmActor, password: string): Promise<void> {
  if (await isPasswordOf(services, actor.accountId, password)) return
  throw new AppError('invalid-input', 'session.wrong_password', {
    countsAsGuess: true, errors: [{ path: 'password', code: 'session.wrong_password' }],
  })
}
