/** A device with its times in words. */
export interface SeenLine {
  id: string
  name: string
  first: string
  last: string
  /** Stands in place of the deed; empty where that may be done. */
  note: string
  /** Which one the deed is about, for readers by ear. */
  about: string
}
