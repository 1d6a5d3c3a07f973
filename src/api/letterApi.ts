import { pageOf } from '../../shared/contract/common.ts'
import { invitationSchema, type Invitation } from '../../shared/contract/invitation.ts'
import { letterSchema, type Letter } from '../../shared/contract/letter.ts'
import { allPages } from './allPages.ts'
import { http } from './http.ts'

/** Invitations onto a farm that wait, and the newest of its letters. */
export const letterApi = {
  invitations: (farmId: string): Promise<Invitation[]> => allPages(`/farms/${farmId}/invitations`, invitationSchema),
  letters: async (farmId: string): Promise<Letter[]> => (await http.get(`/farms/${farmId}/letters`, pageOf(letterSchema), { limit: 100 })).items,
}
