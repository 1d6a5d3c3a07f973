/** How the device stands with the server; `at` is a time of day in words, null before the first sending; `drafts` are begun here and not sent. */
export type SyncState =
  | { kind: 'sent'; at: string | null; drafts: number }
  | { kind: 'sending'; count: number; of: number }
  | { kind: 'kept'; count: number; online: boolean }
  | { kind: 'needsYou'; count: number }
