import type { Command, CommandAnswers, CommandKind } from '../../api/commandTypes.ts'
import { useOutbox, type Submitted } from '../../stores/outbox.ts'

/**
 * The one way to write: `await submit({kind, farmId, id, body})` answers `{state: 'sent', answer}` or
 * `{state: 'kept'}` when there is no signal, and throws ApiError when the server refused.
 */
export function useSubmit(): { submit: <Kind extends CommandKind>(command: Command<Kind>) => Promise<Submitted<CommandAnswers[Kind]>> } {
  const outbox = useOutbox()
  return { submit: (command) => outbox.submit(command) }
}
