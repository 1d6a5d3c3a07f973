import type { CommandKind } from '../api/commandTypes.ts'
import { queryClient } from '../plugins/queryClient.ts'

/** Which reads a command makes old, by the first part of their key. */
const STALE: Record<CommandKind, string[]> = {
  'farm.create': ['farm'],
  'block.create': ['blocks', 'farm', 'start'],
  'block.update': ['blocks', 'farm', 'boundaries'],
  'block.split': ['blocks', 'block', 'blocks-ended', 'farm'],
  'block.merge': ['blocks', 'block', 'blocks-ended', 'farm'],
  'block.reopen': ['blocks', 'block', 'blocks-ended', 'farm'],
  'block.land': ['blocks', 'block'],
  'planting.create': ['plantings', 'blocks'],
  'planting.update': ['plantings', 'blocks'],
  'bed.create': ['beds', 'blocks'],
  'bed.update': ['beds', 'blocks'],
  'event.create': ['farm-events'],
  'event.withdraw': ['farm-events'],
  'site.create': ['sites'],
  'site.change': ['sites'],
  'ground.create': ['ground'],
  'ground.change': ['ground'],
  'block.import': ['blocks', 'farm'],
  'material.create': ['materials', 'start'],
  'lot.create': ['lots'],
  'lot.count': ['lots'],
  'sprayer.create': ['sprayers'],
  'sprayer.update': ['sprayers'],
  'sprayer.retire': ['sprayers'],
  'calibration.create': ['sprayers', 'calibrations'],
  'calibration.withdraw': ['sprayers', 'calibrations'],
  'farm.update': ['farm', 'start'],
  'start.update': ['start'],
  'practice.make': [],
  'practice.away': [],
  'record.create': ['records'],
  'record.update': ['records'],
  'record.sign': ['records', 'files', 'lots', 'start'],
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
