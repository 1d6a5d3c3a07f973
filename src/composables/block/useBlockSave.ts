import type { Ref, ShallowRef } from 'vue'
import { createBlockSchema, type Block } from '../../../shared/contract/block.ts'
import type { Boundary } from '../../../shared/geo/geometryTypes.ts'
import type { Submitted } from '../../stores/outbox.ts'
import type { Caution } from './blockCautions.ts'
import type { BlockDraftContent } from './blockDraftContent.ts'
import { useAsked, type Asked } from './useAsked.ts'
import { useSubmit } from '../form/useSubmit.ts'
import { useTask } from '../form/useTask.ts'

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
export interface BlockSave extends Pick<Asked, 'errors' | 'asked' | 'reasons' | 'forget'> {
  save: (block: BlockToSave) => Promise<Submitted<Block> | undefined>
  saving: Ref<boolean>
  /** Whatever was refused and is at no field. */
  error: ShallowRef<unknown>
}

/** Saves a block through `submit`; what is unlikely is asked once and goes out with its reason. */
export function useBlockSave(): BlockSave {
  const { submit } = useSubmit()
  const { errors, asked, reasons, hasReasons, acknowledged, takeRefusal, forget } = useAsked()
  const task = useTask(async (block: BlockToSave): Promise<Submitted<Block> | undefined> => {
    errors.value = {}
    const body = readBody(block)
    if (body === null || !hasReasons(block.cautions)) return undefined
    try {
      return await submit({ kind: 'block.create', farmId: block.farmId, id: block.id, body })
    } catch (error) {
      if (!takeRefusal(error)) throw error
      return undefined
    }
  })

  function readBody({ id, content, geometry, takenCodes }: BlockToSave) {
    const { code, name, crop } = content
    if (takenCodes.includes(code.trim())) {
      errors.value = { code: { id: 'blocks.form.codeTaken' } }
      return null
    }
    const body = { id, code, name, crop: crop.trim() === '' ? null : crop, geometry, acknowledged: acknowledged() }
    const read = createBlockSchema.safeParse(body)
    if (read.success) return read.data
    errors.value = Object.fromEntries(
      read.error.issues.map(({ path, message }) => [path.join('.'), { id: `problems.${message}` }]),
    )
    return null
  }

  return { save: task.run, saving: task.running, error: task.error, errors, asked, reasons, forget }
}
