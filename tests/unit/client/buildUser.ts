import type { Session } from '../../../shared/contract/session.ts'

/** Somebody who is signed in with a password. */
export const buildUser = (changes: Partial<Session['user']> = {}): Session['user'] => ({
  id: 'account-1', email: 'a@farm.example', name: 'A', language: 'en', signsWith: 'password', hasFactor: false, preferences: {}, revision: 1, ...changes,
})
