import { idSchema } from '../contract/common.ts'

/** What names a job: the step that makes it, its block, and which one of the block's it is, from 1. */
export interface JobKey { stepId: string; blockId: string; number: number }

/** The name of a job as one text. @example jobIdOf({stepId, blockId, number: 3}) // '<step>.<block>.3' */
export function jobIdOf({ stepId, blockId, number }: JobKey): string {
  return `${stepId}.${blockId}.${number}`
}

/** The parts of a job's name; null for any other text. */
export function readJobId(text: string): JobKey | null {
  const parts = /^([^.]+)\.([^.]+)\.([1-9]\d{0,3})$/.exec(text)
  if (parts === null) return null
  const step = idSchema.safeParse(parts[1])
  const block = idSchema.safeParse(parts[2])
  return step.success && block.success ? { stepId: step.data, blockId: block.data, number: Number(parts[3]) } : null
}
