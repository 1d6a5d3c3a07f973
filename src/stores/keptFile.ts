import type { Problem } from '../../shared/contract/problem.ts'
import type { FileToSend } from '../api/fileApi.ts'

/** A photo or paper on this device that the server does not have yet. */
export interface KeptFile extends FileToSend {
  accountId: string
  keptAt: string
  /** `needsYou`: the server read it and refused it, so it waits for a person. */
  state: 'kept' | 'needsYou'
  /** Why it was refused, or why it waits. */
  problem: Problem | null
  /** Whether the server has ever shown the record it belongs to. */
  recordSeen: boolean
}
