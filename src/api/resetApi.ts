import { z } from 'zod'
import { http } from './http.ts'

/** A new password by letter. */
export const resetApi = {
  ask: (email: string): Promise<unknown> => http.post('/reset', { email }, z.unknown()),
  read: (token: string): Promise<{ email: string }> => http.get(`/reset/${encodeURIComponent(token)}`, z.object({ email: z.string() })),
  spend: (token: string, password: string): Promise<unknown> => http.post('/reset/password', { token, password }, z.unknown()),
}
