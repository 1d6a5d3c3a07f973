import { readConfig } from '../../server/config.ts'
import { startJobs } from '../../server/jobs/startJobs.ts'
import { startServices } from '../../server/startServices.ts'
import '../../shared/messages/everyLanguage.ts'

/** A server as far as its letters go, in a process of its own that a test may kill; says READY when it carries them. */
await startJobs(await startServices(readConfig(process.env)))
process.stdout.write('READY\n')
