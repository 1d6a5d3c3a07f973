import type { Message } from '../contract/common.ts'
import type { Check, Rests, Verdict } from '../contract/record.ts'
import type { MessageId } from '../messages/en.ts'

export type Params = Message['params']

/** A message whose words exist; a mistyped id does not compile. */
export const words = (id: MessageId, params: Params = {}): Message => ({ id, params })

export interface CheckParts {
  code: string
  verdict: Verdict
  rests: Rests
  title: Message
  text: Message
  figure?: Message
  source?: Message | null
  band?: Check['band']
  about?: string
}

/** One check with its empty parts written as null, as the contract has them. */
export function buildCheck({ figure, source, band, about, ...parts }: CheckParts): Check {
  return { ...parts, figure: figure ?? null, source: source ?? null, band: band ?? null, about: about ?? null }
}
