import type { Problem } from '../../shared/contract/problem.ts'
import type { Command } from '../api/commandTypes.ts'

/** A command on this device that the server has not answered yet. */
export interface KeptCommand {
  key: string
  accountId: string
  command: Command
  keptAt: string
  /** `needsYou`: the server read it and refused it, so it waits for a person. */
  state: 'kept' | 'sending' | 'needsYou'
  problem: Problem | null
}
