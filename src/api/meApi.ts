import { z } from 'zod'
import { factorOfferSchema, factorStateSchema, ownSessionsSchema, recoveryCodesSchema, type ChangeMe, type FactorOffer, type FactorState, type OwnSession } from '../../shared/contract/me.ts'
import { sessionSchema, type Session } from '../../shared/contract/session.ts'
import { http } from './http.ts'

const nothing = z.unknown()
interface Proof { password: string; code: string }

/** One's own account. */
export const meApi = {
  change: (body: ChangeMe): Promise<Session['user']> => http.patch('/me', body, sessionSchema.shape.user),
  changePassword: (password: string, newPassword: string): Promise<unknown> => http.put('/me/password', { password, newPassword }, nothing),
  sessions: (): Promise<OwnSession[]> => http.get('/me/sessions', ownSessionsSchema).then(({ items }) => items),
  endSession: (id: string): Promise<unknown> => http.del(`/me/sessions/${id}`, nothing),
  endOthers: (): Promise<unknown> => http.del('/me/sessions', nothing),
  factor: (): Promise<FactorState> => http.get('/me/second-factor', factorStateSchema),
  beginFactor: (password: string): Promise<FactorOffer> => http.post('/me/second-factor', { password }, factorOfferSchema),
  confirmFactor: (code: string): Promise<string[]> => http.put('/me/second-factor', { code }, recoveryCodesSchema).then(({ codes }) => codes),
  removeFactor: (proof: Proof): Promise<unknown> => http.post('/me/second-factor/remove', proof, nothing),
  renewCodes: (proof: Proof): Promise<string[]> => http.post('/me/second-factor/codes', proof, recoveryCodesSchema).then(({ codes }) => codes),
}
