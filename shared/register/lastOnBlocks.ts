import type { Block } from '../contract/block.ts'
import type { RegisterRow } from '../contract/record.ts'
import { compareCodes } from '../records/compareCodes.ts'

export interface LastOnBlock {
  block: Block
  /** The latest signed record of it among the rows that were read; null where there is none. */
  row: RegisterRow | null
}

/**
 * The latest signed work on each block among rows of the register, longest ago first and never seen before all others.
 * @param rows in any order; withdrawn and unsigned ones are left out.
 */
export function lastOnBlocks(blocks: readonly Block[], rows: readonly RegisterRow[]): LastOnBlock[] {
  const last = new Map<string, RegisterRow>()
  for (const row of rows) {
    if (row.state !== 'signed' || row.startedAt === null) continue
    for (const { id } of row.blocks) {
      const known = last.get(id)
      if (known === undefined || startOf(known) < startOf(row)) last.set(id, row)
    }
  }
  return blocks
    .map((block) => ({ block, row: last.get(block.id) ?? null }))
    .sort((one, other) => startOf(one.row) - startOf(other.row) || compareCodes(one.block.code, other.block.code))
}

function startOf(row: RegisterRow | null): number {
  const at = row?.startedAt ?? null
  return at === null ? Number.NEGATIVE_INFINITY : Date.parse(at)
}
