import { z } from 'zod'
import { welcomeSchema, type Welcome } from '../../shared/contract/welcome.ts'
import { http } from './http.ts'

/** The one-time link of who was invited. */
export const welcomeApi = {
  read: (token: string): Promise<Welcome> => http.get(`/welcome/${encodeURIComponent(token)}`, welcomeSchema),
  accept: (token: string, name: string, password: string): Promise<unknown> => http.post('/welcome', { token, name, password }, z.unknown()),
  take: (token: string): Promise<{ farmId: string }> => http.post('/welcome/accept', { token }, z.object({ farmId: z.string() })),
}
