import { In, type EntityManager } from 'typeorm'
import type { Invitation as InvitationAnswer } from '../../../shared/contract/invitation.ts'
import type { Invitation } from '../../entities/Invitation.ts'
import { Letter } from '../../entities/Letter.ts'
import { Person } from '../../entities/Person.ts'
import type { Services } from '../services.ts'

/** Under which mark the last letter of an invitation stands in the outbox. */
export const letterMark = ({ id, revision }: Pick<Invitation, 'id' | 'revision'>): string => `invitation ${id} ${revision}`

/** Invitations as the farm's owners see them, with how far the letter has got. */
export async function presentInvitations({ clock }: Pick<Services, 'clock'>, manager: EntityManager, invitations: Invitation[]): Promise<InvitationAnswer[]> {
  if (invitations.length === 0) return []
  const farmId = invitations[0]?.farmId ?? ''
  const people = await manager.find(Person, { select: { id: true, name: true }, where: { farmId, id: In(invitations.map(({ invitedById }) => invitedById)) } })
  const letters = await manager.find(Letter, { select: { once: true, state: true, lastFault: true }, where: { farmId, once: In(invitations.map(letterMark)) } })
  return invitations.map((invitation) => {
    const { id, email, name, role, language, sentAt, expiresAt, revision } = invitation
    const letter = letters.find(({ once }) => once === letterMark(invitation))
    return {
      id, email, name, role, language, revision, sentAt: sentAt.toISOString(), expiresAt: expiresAt.toISOString(), isLate: expiresAt <= clock.now(),
      invitedBy: people.find((person) => person.id === invitation.invitedById)?.name ?? '',
      letter: letter === undefined ? null : letter.state === 'waiting' && letter.lastFault !== null ? 'failing' : letter.state,
    }
  })
}
