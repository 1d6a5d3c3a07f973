import type { CommandKind } from '../api/commandTypes.ts'
import { queryClient } from '../plugins/queryClient.ts'

/** Which reads a command makes old, by the first part of their key. */
const STALE: Record<CommandKind, string[]> = {
  'farm.create': ['farm'],
  'block.create': ['blocks', 'farm'],
  'material.create': ['materials'],
  'lot.create': ['lots'],
  'lot.count': ['lots'],
  'sprayer.create': ['sprayers'],
  'record.create': ['records'],
  'record.update': ['records'],
  'record.sign': ['records', 'files', 'lots'],
  'filter.keep': ['filters'],
  'filter.forget': ['filters'],
  'record.signMany': ['records', 'files', 'lots'],
  'record.amend': ['records', 'files', 'lots'],
  'record.withdraw': ['records', 'files', 'lots'],
  'record.review': ['records'],
  'record.discard': ['records'],
}

/** Reads again, in the background, what a command has changed. */
export function refreshAfter(command: { kind: CommandKind; farmId: string }): void {
  for (const name of STALE[command.kind]) void queryClient.invalidateQueries({ queryKey: [name, command.farmId] })
}
