import { z } from 'zod'
import { sessionSchema, type Session } from '../../shared/contract/session.ts'
import { http } from './http.ts'

/** The one-time link by which an invited person sets a password. */
export const welcomeApi = {
  read: (token: string): Promise<{ email: string }> =>
    http.get(`/welcome/${encodeURIComponent(token)}`, z.object({ email: z.string() })),
  accept: (token: string, name: string, password: string): Promise<Session> =>
    http.post('/welcome', { token, name, password }, sessionSchema),
}
