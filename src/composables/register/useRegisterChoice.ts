import { computed, shallowRef, watch, type ComputedRef } from 'vue'
import { useRoute, useRouter } from 'vue-router'
import type { RegisterFilter, RegisterSort } from '../../../shared/contract/register.ts'
import { countChosen, readAddress, writeAddress, type RegisterChoice } from './registerAddress.ts'

export interface ChosenRegister {
  choice: ComputedRef<RegisterChoice>
  /** How many parts of the filter are chosen. */
  chosenCount: ComputedRef<number>
  change: (filter: RegisterFilter) => void
  sortBy: (sort: RegisterSort) => void
  clear: () => void
}

/** Filter and order of the register live in the address: back undoes them, and a link shows the same. */
export function useRegisterChoice(): ChosenRegister {
  const route = useRoute()
  const router = useRouter()
  const choice = shallowRef(readAddress(route.query))
  // On the way to another page the address is no longer this one's.
  watch(() => route.query, (query) => { if (route.name === 'register') choice.value = readAddress(query) })
  const go = (next: RegisterChoice): void => { void router.push({ name: 'register', query: writeAddress(next) }) }
  return {
    choice: computed(() => choice.value),
    chosenCount: computed(() => countChosen(choice.value.filter)),
    change: (filter) => { go({ ...choice.value, filter }) },
    sortBy: (sort) => { go({ ...choice.value, sort }) },
    clear: () => { go({ ...choice.value, filter: {} }) },
  }
}
