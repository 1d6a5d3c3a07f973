import type { UseQueryReturnType } from '@tanstack/vue-query'
import type { Letter } from '../../../shared/contract/letter.ts'
import { letterApi } from '../../api/letterApi.ts'
import { newId } from '../form/newId.ts'
import { useFarmRead } from './useFarmRead.ts'
import { useSubmit } from '../form/useSubmit.ts'
import { useTask, type Task } from '../form/useTask.ts'

/** The newest letters of a farm, and sending one again. */
export function useLetters(farmId: () => string): { letters: UseQueryReturnType<Letter[], Error>; resend: Task<[id: string], unknown> } {
  const { submit } = useSubmit()
  return {
    letters: useFarmRead('letters', farmId, (id) => letterApi.letters(id)),
    resend: useTask((id: string) => submit({ kind: 'letter.resend', farmId: farmId(), id, body: { id: newId() } })),
  }
}
