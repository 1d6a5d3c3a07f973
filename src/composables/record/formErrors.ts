import { computed, type ComputedRef, type Ref } from 'vue'
import { useI18n } from 'vue-i18n'
import { fieldErrors } from '../form/fieldErrors.ts'
import type { Gaps } from './gaps.ts'

interface ErrorSources {
  gaps: Ref<Gaps>
  live: Ref<Gaps>
  tried: Ref<boolean>
  refusals: Ref<unknown>[]
}

/** A refusal speaks of `components.0.basis.kind`; the form has one field for it. */
function fieldOf(path: string): string {
  if (path.startsWith('water')) return 'water'
  const counted = path.includes('.counts') ? 4 : 3
  const depth = path.startsWith('weather') ? 2 : counted
  return path.split('.').slice(0, depth).join('.')
}

/** The sentence of each field: what is no number as one types, what is missing once signing was tried, what the server refused. */
export function formErrors({ gaps, live, tried, refusals }: ErrorSources): ComputedRef<Record<string, string>> {
  const { t } = useI18n()
  return computed(() => {
    const found = Object.entries({ ...live.value, ...(tried.value && gaps.value) })
    const said = found.flatMap(([path, id]) => (id === undefined ? [] : [[path, t(id)] as const]))
    const refused = refusals.flatMap((refusal) => Object.entries(fieldErrors(refusal.value)).map(([path, words]) => [fieldOf(path), words] as const))
    return Object.fromEntries([...refused, ...said])
  })
}
