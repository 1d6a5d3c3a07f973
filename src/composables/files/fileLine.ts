import type { FileKind } from '../../../shared/contract/attachment.ts'

/** One photo or paper as a reader finds it: in the record already, or on its way. */
export interface FileLine {
  id: string
  kind: FileKind
  label: string
  /** "Photo, 1.2 MB". */
  what: string
  /** "Tam Lisk, Tue 16 Jun, 07:12"; empty while it is on its way. */
  who: string
  isPdf: boolean
  /** A small picture of it; empty for a PDF. */
  picture: string
  /** Where it opens; empty while it is on its way. */
  shown: string
  /** As it came in, for whoever may open that; else empty. */
  original: string
  /** What stands beside it: "Added after the signature"; empty for none. */
  mark: string
  state: 'there' | 'waits' | 'sending' | 'refused'
  /** Whole per cent that have gone. */
  percent: number
  /** Why it waits or was refused. */
  problem: string
  mayRemove: boolean
}
