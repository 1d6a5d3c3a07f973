import { reactive, type Reactive } from 'vue'
import type { Person } from '../../../shared/contract/person.ts'
import { useProof, type Proof } from './useProof.ts'
import { useSubmit } from '../form/useSubmit.ts'

export const PERSON_DEEDS = ['change', 'letGo', 'takeBack', 'pin', 'sessions', 'factor'] as const
/** What an owner does about a person. */
export type PersonDeed = (typeof PERSON_DEEDS)[number]

export interface PersonFields { name: string; role: string; pin: string }

/** The deeds that make sense for a person as they stand; one's own access is not ended here. */
export function deedsFor(person: Person, ownId: string | null): PersonDeed[] {
  const isOther = person.id !== ownId
  const open: Record<PersonDeed, boolean> = {
    change: true,
    letGo: person.active && isOther,
    takeBack: !person.active,
    pin: person.active && person.role === 'applicator' && person.signsWith !== 'password',
    sessions: person.signsWith !== null && isOther,
    factor: person.hasFactor && isOther,
  }
  return PERSON_DEEDS.filter((deed) => open[deed])
}

/** The form of one deed: its fields, and the password that proves it. */
export function usePersonDeed(farmId: () => string, person: () => Person, deed: () => PersonDeed): { fields: Reactive<PersonFields>; proof: Proof } {
  const { submit } = useSubmit()
  const fields = reactive<PersonFields>({ name: '', role: '', pin: '' })

  function send(password: string): Promise<unknown> {
    const { id, revision } = person()
    const about = { farmId: farmId(), id }
    const doings: Record<PersonDeed, () => Promise<unknown>> = {
      change: () => submit({ kind: 'person.change', ...about, body: { revision, password, name: fields.name, role: fields.role as 'owner' | 'manager' | 'applicator' } }),
      letGo: () => submit({ kind: 'person.change', ...about, body: { revision, password, active: false } }),
      takeBack: () => submit({ kind: 'person.change', ...about, body: { revision, password, active: true } }),
      pin: () => submit({ kind: 'person.pin', ...about, body: { revision, password, pin: fields.pin } }),
      sessions: () => submit({ kind: 'person.endSessions', ...about, body: { password } }),
      factor: () => submit({ kind: 'person.resetFactor', ...about, body: { password } }),
    }
    return doings[deed()]()
  }

  const proof = useProof(send, ['name', 'role', 'pin', 'password'])
  return {
    fields,
    proof: {
      ...proof,
      begin: () => {
        Object.assign(fields, { name: person().name, role: person().role, pin: '' })
        proof.begin()
      },
    },
  }
}
