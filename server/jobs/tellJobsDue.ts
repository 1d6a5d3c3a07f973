import { mailJobsDue } from '../services/rounds/mailJobsDue.ts'
import type { Job } from './job.ts'

/** Looks every ten minutes where it is past five in the morning: farms lie in every zone. */
export const tellJobsDue: Job = { name: 'tell-jobs-due', cron: '*/10 * * * *', run: mailJobsDue }
