import type { MessageId } from '../../../shared/messages/en.ts'
import type { Command } from '../../api/commandTypes.ts'

/** What was decided of a job, as it is told where it is kept. */
export interface KeptJob {
  /** Null where the name of the command says it all. Civil days stay as they are: whoever shows them puts them in words. */
  wanted: { id: MessageId; days: { from?: string; to?: string }; reason?: string } | null
  /** How to go on where it was refused. */
  goOn: MessageId
}

/** Null for whatever is no decision on a job. */
export function keptJob(command: Command): KeptJob | null {
  switch (command.kind) {
    case 'job.move': return { wanted: wantedDay(command.body.to, command.about?.day), goOn: 'rounds.kept.goOnMove' }
    case 'job.skip': return { wanted: { id: 'rounds.kept.reason', days: {}, reason: command.body.reason }, goOn: 'rounds.kept.goOn' }
    case 'job.unskip': return { wanted: null, goOn: 'rounds.kept.goOn' }
    default: return null
  }
}

function wantedDay(to: string | null, from: string | undefined): KeptJob['wanted'] {
  if (to === null) return { id: 'rounds.kept.moveBack', days: {} }
  return from === undefined ? { id: 'rounds.kept.moveTo', days: { to } } : { id: 'rounds.kept.move', days: { from, to } }
}
