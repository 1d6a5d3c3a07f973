import type { MessageId } from '../../../shared/messages/en.ts'

/** What is missing or cannot stand, by the path of the field in the record. */
export type Gaps = Partial<Record<string, MessageId>>
