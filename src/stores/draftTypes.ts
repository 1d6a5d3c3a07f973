/** What a draft is of. */
export type DraftKind = 'record' | 'block' | 'amendment' | 'shape' | 'split' | 'merge' | 'place' | 'plan'

/** Something begun and not yet sent, kept on this device at every keystroke and read only by its account. */
export interface Draft<Content = unknown> {
  id: string
  kind: DraftKind
  farmId: string
  accountId: string
  content: Content
  /** Instants, RFC 3339. */
  begunAt: string
  updatedAt: string
}
