import type { IconName } from '../marks/iconNames.ts'

/** One place of the spine: its route, its word, and a count after it. */
export interface Place {
  name: string
  to: string
  words: string
  icon: IconName
  count?: number
}
