import { z } from 'zod'
import { systemClock } from '../clock.ts'
import { openDatabase } from '../database/database.ts'
import { prepareDatabase } from '../database/prepareDatabase.ts'
import { inviteOwner } from '../services/welcome.ts'

const environment = z.object({
  DATABASE_URL: z.string(),
  DATABASE_OWNER_URL: z.string(),
  PUBLIC_URL: z.string().default('http://127.0.0.1:4310'),
})

/** Prints a one-time link with which the first owner takes a password. */
async function main(): Promise<void> {
  const email = z.email('Give an e-mail: npm run owner -- name@farm.example').parse(process.argv[2])
  const env = environment.parse(process.env)
  await prepareDatabase(env.DATABASE_OWNER_URL, decodeURIComponent(new URL(env.DATABASE_URL).username))
  const database = await openDatabase(env.DATABASE_URL, 1, () => undefined)
  const { token, expiresAt } = await inviteOwner({ database, clock: systemClock }, email)
  await database.close()
  process.stdout.write(`${env.PUBLIC_URL.replace(/\/$/, '')}/welcome/${token}\n`)
  process.stdout.write(`Works once, until ${expiresAt.toISOString().slice(0, 16).replace('T', ' ')} UTC.\n`)
}

main().catch((error: unknown) => {
  const words = error instanceof z.ZodError ? error.issues.map((issue) => issue.message).join('; ') : String(error instanceof Error ? error.message : error)
  process.stderr.write(`${words}\n`)
  process.exit(1)
})
