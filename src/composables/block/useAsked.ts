import { ref, shallowRef, type Ref, type ShallowRef } from 'vue'
import { ApiError } from '../../api/errors.ts'
import { cautionsOf, type Caution } from './blockCautions.ts'
import { fieldErrors } from '../form/fieldErrors.ts'

/** Words ready to read, or the id of a message. */
export type FieldError = { words: string } | { id: string }

/** What is unlikely about an outline, asked once and sent with its reason; and what a refusal says at which field. */
export interface Asked {
  /** Codes of messages by field, or the server's own words. */
  errors: Ref<Record<string, FieldError>>
  /** What is unlikely and waits for a reason; empty while nothing is asked. */
  asked: ShallowRef<readonly Caution[]>
  /** Reasons by code. */
  reasons: Ref<Record<string, string>>
  /** Whether nothing unlikely waits for a reason; what is new is asked first, what was asked is missed. */
  hasReasons: (cautions: readonly Caution[]) => boolean
  acknowledged: () => { code: string; reason: string }[]
  /** Shows a refusal at its fields or as cautions; false where it belongs to neither. */
  takeRefusal: (error: unknown) => boolean
  /** Asks nothing any more: the outline has changed. */
  forget: () => void
}

export function useAsked(): Asked {
  const errors = ref<Record<string, FieldError>>({})
  const asked = shallowRef<readonly Caution[]>([])
  const reasons = ref<Record<string, string>>({})

  function hasReasons(cautions: readonly Caution[]): boolean {
    const before = new Set(asked.value.map(({ code }) => code))
    const found = new Set(cautions.map(({ code }) => code))
    asked.value = [...cautions, ...asked.value.filter(({ code }) => !found.has(code))]
    const missing = asked.value.filter(({ code }) => (reasons.value[code] ?? '').trim() === '')
    const missed = missing.filter(({ code }) => before.has(code))
    errors.value = Object.fromEntries(missed.map(({ code }) => [`reason.${code}`, { id: 'blocks.unlikely.reasonNeeded' }]))
    return missing.length === 0
  }

  function takeRefusal(error: unknown): boolean {
    if (!(error instanceof ApiError)) return false
    const cautions = cautionsOf(error.problem)
    if (cautions.length > 0) {
      asked.value = cautions
      return true
    }
    errors.value = Object.fromEntries(Object.entries(fieldErrors(error)).map(([path, words]) => [path, { words }]))
    return Object.keys(errors.value).length > 0
  }

  return {
    errors, asked, reasons, hasReasons, takeRefusal,
    acknowledged: () => Object.entries(reasons.value)
      .filter(([, reason]) => reason.trim() !== '')
      .map(([code, reason]) => ({ code, reason })),
    forget: () => {
      asked.value = []
      errors.value = {}
    },
  }
}
