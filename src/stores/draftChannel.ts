/** Told to the other tabs once a draft is on the device. */
export interface DraftWritten {
  id: string
  /** Instant, RFC 3339. */
  updatedAt: string
}

/** What is used of a channel between the tabs of one browser. */
export type DraftChannel = Pick<BroadcastChannel, 'postMessage' | 'close' | 'onmessage'>

/** Opens the channel on which tabs tell each other of drafts; whoever opens it closes it. */
export function openDraftChannel(): DraftChannel {
  return new BroadcastChannel('drenchleaf-drafts')
}
