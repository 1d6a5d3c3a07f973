import { pruneOld } from '../services/pruneOld.ts'
import type { Job } from './job.ts'

/** Once a day, when few are at work in most zones. */
export const pruneDaily: Job = { name: 'prune-old', cron: '40 3 * * *', run: pruneOld }
