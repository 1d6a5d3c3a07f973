import type { CommandKind } from '../api/commandTypes.ts'
import { queryClient } from '../plugins/queryClient.ts'

/** What follows from signed records and from plans. */
const ROUNDS = ['season-sheet', 'jobs-waiting']

/** Which reads a command makes old, by the first part of their key. */
const STALE: Record<CommandKind, string[]> = {
  'farm.create': ['farm'],
  'block.create': ['blocks', 'farm', 'start', 'season-sheet'],
  'block.update': ['blocks', 'farm', 'boundaries'],
  'block.split': ['blocks', 'block', 'blocks-ended', 'farm', 'season-sheet'],
  'block.merge': ['blocks', 'block', 'blocks-ended', 'farm', 'season-sheet'],
  'block.reopen': ['blocks', 'block', 'blocks-ended', 'farm', 'season-sheet'],
  'block.land': ['blocks', 'block'],
  'planting.create': ['plantings', 'blocks', 'season-sheet'],
  'planting.update': ['plantings', 'blocks', 'season-sheet'],
  'bed.create': ['beds', 'blocks'],
  'bed.update': ['beds', 'blocks'],
  'event.create': ['farm-events'],
  'event.withdraw': ['farm-events'],
  'site.create': ['sites'],
  'site.change': ['sites'],
  'ground.create': ['ground'],
  'ground.change': ['ground'],
  'block.import': ['blocks', 'farm', 'season-sheet'],
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
  'record.create': ['records', ...ROUNDS],
  'record.update': ['records', ...ROUNDS],
  'record.sign': ['records', 'files', 'lots', 'start', ...ROUNDS],
  'plan.create': ['season-plans', ...ROUNDS],
  'plan.update': ['season-plans', ...ROUNDS],
  'plan.end': ['season-plans', ...ROUNDS],
  'plan.reopen': ['season-plans', ...ROUNDS],
  'job.move': ROUNDS,
  'job.skip': ROUNDS,
  'job.unskip': ROUNDS,
  'grant.give': ['grants'],
  'grant.change': ['grants'],
  'grant.end': ['grants'],
  'invitation.create': ['invitations', 'letters', 'start'],
  'invitation.resend': ['invitations', 'letters'],
  'invitation.withdraw': ['invitations'],
  'letter.resend': ['letters'],
  'filter.keep': ['filters'],
  'filter.forget': ['filters'],
  'record.signMany': ['records', 'files', 'lots', ...ROUNDS],
  'record.amend': ['records', 'files', 'lots', ...ROUNDS],
  'record.withdraw': ['records', 'files', 'lots', ...ROUNDS],
  'record.review': ['records'],
  'record.discard': ['records', ...ROUNDS],
}

/** Reads again, in the background, what a command has changed. */
export function refreshAfter(command: { kind: CommandKind; farmId: string }): void {
  for (const name of STALE[command.kind]) void queryClient.invalidateQueries({ queryKey: [name, command.farmId] })
}
