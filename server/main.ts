import { createServer, type Server } from 'node:http'
import { createApp } from './app.ts'
import { readConfig, type Config } from './config.ts'
import { seedDemo } from './demo/seedDemo.ts'
import { startJobs, type RunningJobs } from './jobs/startJobs.ts'
import { CLIENT_FOLDER } from './projectFolders.ts'
import { publicAddress } from './services/publicAddress.ts'
import type { Services } from './services/services.ts'
import { startServices } from './startServices.ts'

/** config → database → demo → listen → serve until told to stop. */
async function main(): Promise<void> {
  const config = readConfig(process.env)
  const services = await startServices(config)
  const demo = config.demo === null ? null : await seedDemo(services, config.demo.password)
  const { app, close } = createApp(services, CLIENT_FOLDER)
  const server = createServer(app)
  // Longer than a proxy or a phone keeps an idle connection: neither then sends into one that this side has just closed.
  server.keepAliveTimeout = 75_000
  server.headersTimeout = 80_000
  await listen(server, config)
  const jobs = await startJobs(services)
  const stop = () => void shutDown({ server, services, jobs, close })
  process.once('SIGTERM', stop)
  process.once('SIGINT', stop)
  process.stdout.write(`READY ${JSON.stringify({ url: publicAddress(config), ...demo })}\n`)
  if (demo) {
    process.stdout.write(`\nOpen ${publicAddress(config)} and sign in with the password ${demo.password} as one of\n`)
    for (const email of Object.values(demo.accounts)) process.stdout.write(`  ${email}\n`)
  }
}

function listen(server: Server, { port, host }: Config): Promise<void> {
  return new Promise((resolve, reject) => {
    server.once('error', reject)
    server.listen(port, host, resolve)
  })
}

interface Running { server: Server; services: Services; jobs: RunningJobs; close(): void }

/** Takes no more, finishes what is in hand, and only then lets go of the database. */
async function shutDown({ server, services, jobs, close }: Running): Promise<void> {
  server.close()
  server.closeIdleConnections()
  await jobs.stop()
  await services.mailer.close()
  close()
  await services.reports.close()
  server.closeAllConnections()
  await services.database.close()
  process.exit(0)
}

main().catch((error: unknown) => {
  process.stderr.write(`Drenchleaf did not start: ${error instanceof Error ? error.message : String(error)}\n`)
  process.exit(1)
})
