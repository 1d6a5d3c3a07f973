import { ref, shallowRef, type Ref, type ShallowRef } from 'vue'
import { createBlockSchema, type Block } from '../../shared/contract/block.ts'
import type { Boundary } from '../../shared/geo/geometryTypes.ts'
import { ApiError } from '../api/errors.ts'
import type { Submitted } from '../stores/outbox.ts'
import { cautionsOf, type Caution } from './blockCautions.ts'
import type { BlockDraftContent } from './blockDraftContent.ts'
import { fieldErrors } from './fieldErrors.ts'
import { useSubmit } from './useSubmit.ts'
import { useTask } from './useTask.ts'

/** What is sent, and what was found unlikely on this device before it is. */
export interface BlockToSave {
  farmId: string
  id: string
  content: BlockDraftContent
  geometry: Boundary
  cautions: readonly Caution[]
  /** Codes of the blocks that are there. */
  takenCodes: readonly string[]
}

/** How saving a block stands. */
export interface BlockSave {
  save: (block: BlockToSave) => Promise<Submitted<Block> | undefined>
  saving: Ref<boolean>
  /** Whatever was refused and is at no field. */
  error: ShallowRef<unknown>
  /** Codes of messages by field, or the server's own words. */
  errors: Ref<Record<string, FieldError>>
  /** What is unlikely and waits for a reason; empty while nothing is asked. */
  asked: ShallowRef<readonly Caution[]>
  /** Reasons by code. */
  reasons: Ref<Record<string, string>>
  /** Asks nothing any more: the outline has changed. */
  forget: () => void
}

/** Words ready to read, or the id of a message. */
export type FieldError = { words: string } | { id: string }

/** Saves a block through `submit`; what is unlikely is asked once and goes out with its reason. */
export function useBlockSave(): BlockSave {
  const { submit } = useSubmit()
  const errors = ref<Record<string, FieldError>>({})
  const asked = shallowRef<readonly Caution[]>([])
  const reasons = ref<Record<string, string>>({})
  const task = useTask(async (block: BlockToSave): Promise<Submitted<Block> | undefined> => {
    errors.value = {}
    const body = readBody(block)
    if (body === null || !hasReasons(block.cautions)) return undefined
    try {
      return await submit({ kind: 'block.create', farmId: block.farmId, id: block.id, body })
    } catch (error) {
      if (!(error instanceof ApiError) || !takeRefusal(error)) throw error
      return undefined
    }
  })

  function readBody({ id, content, geometry, takenCodes }: BlockToSave) {
    const { code, name, crop } = content
    if (takenCodes.includes(code.trim())) {
      errors.value = { code: { id: 'blocks.form.codeTaken' } }
      return null
    }
    const acknowledged = Object.entries(reasons.value)
      .filter(([, reason]) => reason.trim() !== '')
      .map(([each, reason]) => ({ code: each, reason }))
    const body = { id, code, name, crop: crop.trim() === '' ? null : crop, geometry, acknowledged }
    const read = createBlockSchema.safeParse(body)
    if (read.success) return read.data
    errors.value = Object.fromEntries(
      read.error.issues.map(({ path, message }) => [path.join('.'), { id: `problems.${message}` }]),
    )
    return null
  }

  /** Whether nothing unlikely waits for a reason; what is new is asked first, what was asked is missed. */
  function hasReasons(cautions: readonly Caution[]): boolean {
    const before = new Set(asked.value.map(({ code }) => code))
    const found = new Set(cautions.map(({ code }) => code))
    asked.value = [...cautions, ...asked.value.filter(({ code }) => !found.has(code))]
    const missing = asked.value.filter(({ code }) => (reasons.value[code] ?? '').trim() === '')
    const missed = missing.filter(({ code }) => before.has(code))
    errors.value = Object.fromEntries(missed.map(({ code }) => [`reason.${code}`, { id: 'blocks.unlikely.reasonNeeded' }]))
    return missing.length === 0
  }

  /** Shows a refusal at its fields or as cautions; false where it belongs to neither. */
  function takeRefusal(error: ApiError): boolean {
    const cautions = cautionsOf(error.problem)
    if (cautions.length > 0) {
      asked.value = cautions
      return true
    }
    errors.value = Object.fromEntries(Object.entries(fieldErrors(error)).map(([path, words]) => [path, { words }]))
    return Object.keys(errors.value).length > 0
  }

  function forget(): void {
    asked.value = []
    errors.value = {}
  }

  return { save: task.run, saving: task.running, error: task.error, errors, asked, reasons, forget }
}
