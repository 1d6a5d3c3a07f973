import { sendDueLetters } from '../services/mail/sendDueLetters.ts'
import type { Job } from './job.ts'

/** Carries out what waits; most letters have gone already, as soon as they were written. */
export const sendLetters: Job = { name: 'send-letters', cron: '* * * * *', run: sendDueLetters }
