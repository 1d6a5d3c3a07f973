import { z } from 'zod'

const environment = z.object({
  PORT: z.coerce.number().int().min(0).max(65535).default(4310),
  HOST: z.string().min(1).default('127.0.0.1'),
  DATABASE_URL: z.string().regex(/^postgres(ql)?:\/\//, 'must be a postgres:// address (the app role)'),
  DATABASE_OWNER_URL: z.string().regex(/^postgres(ql)?:\/\//, 'must be a postgres:// address (the owner role)'),
  DATABASE_POOL: z.coerce.number().int().min(1).max(200).default(10),
  SESSION_SECRET: z.string().min(32, 'must have at least 32 characters'),
  PUBLIC_URL: z.url('must be the address people open, https://…').optional(),
  LOG_FILE: z.string().optional(),
  SEED_DEMO: z.enum(['0', '1']).default('0'),
  DEMO_PASSWORD: z.string().min(8).optional(),
  FIXED_CLOCK: z.iso.datetime({ offset: true }).optional(),
})

export interface Config {
  port: number
  host: string
  databaseUrl: string
  databaseOwnerUrl: string
  databasePool: number
  sessionSecret: string
  publicUrl: string | null
  logFile: string | null
  demo: { password: string } | null
  fixedClock: string | null
}

/**
 * The environment, read once.
 * @throws {Error} with one line that names every bad variable and what it must be.
 */
export function readConfig(env: NodeJS.ProcessEnv): Config {
  const result = environment.safeParse(env)
  if (!result.success) {
    const faults = result.error.issues.map((issue) => `${issue.path.join('.')} ${issue.message}`)
    throw new Error(`The environment is not right: ${faults.join('; ')}`)
  }
  const values = result.data
  return {
    port: values.PORT,
    host: values.HOST,
    databaseUrl: values.DATABASE_URL,
    databaseOwnerUrl: values.DATABASE_OWNER_URL,
    databasePool: values.DATABASE_POOL,
    sessionSecret: values.SESSION_SECRET,
    publicUrl: values.PUBLIC_URL?.replace(/\/$/, '') ?? null,
    logFile: values.LOG_FILE ?? null,
    demo: values.SEED_DEMO === '1' && values.DEMO_PASSWORD ? { password: values.DEMO_PASSWORD } : null,
    fixedClock: values.FIXED_CLOCK ?? null,
  }
}
