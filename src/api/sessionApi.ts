import { z } from 'zod'
import { sessionSchema, type Session } from '../../shared/contract/session.ts'
import { http } from './http.ts'

/** Signing in, staying and leaving. */
export const sessionApi = {
  read: (): Promise<Session> => http.get('/session', sessionSchema),
  signIn: (email: string, password: string, code?: string): Promise<Session> => http.post('/session', { email, password, code }, sessionSchema),
  signInByPin: (personId: string, pin: string): Promise<Session> => http.post('/shared-phone/session', { personId, pin }, sessionSchema),
  signOut: (): Promise<unknown> => http.del('/session', z.unknown()),
}
