import type { Message } from '../../../shared/contract/common.ts'
import { messageFor } from '../../../shared/messages/messageFor.ts'
import { renderMessage } from '../../../shared/messages/renderMessage.ts'
import { usePreferences } from '../../stores/preferences.ts'
import { problemWords } from './problemWords.ts'

/** Verdicts and refusals in the person's language and measures. */
export function useMessages(): {
  render: (message: Message) => string
  problem: (error: unknown) => string
} {
  const preferences = usePreferences()
  return {
    render: (message) => renderMessage(preferences.language, messageFor(message, preferences.units)),
    problem: (error) => problemWords(preferences.language, error),
  }
}
