import type { Ref } from 'vue'
import { meApi } from '../../api/meApi.ts'
import { useProof, type Proof } from './useProof.ts'

/** Takes the password or PIN in `next` for the one that is proved. */
export function useNewPassword(next: Ref<string>): Proof {
  return useProof((password) => meApi.changePassword(password, next.value), ['password', 'newPassword'])
}
