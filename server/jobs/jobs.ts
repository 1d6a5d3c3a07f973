import type { Job } from './job.ts'
import { pruneDaily } from './pruneDaily.ts'
import { sendLetters } from './sendLetters.ts'
import { tellJobsDue } from './tellJobsDue.ts'

/** All timed work. */
export const JOBS: readonly Job[] = [sendLetters, tellJobsDue, pruneDaily]
