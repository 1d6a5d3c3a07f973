import { join } from 'node:path'
import { z } from 'zod'
import { lineText } from '../shared/contract/text.ts'
import type { Bucket } from './adapters/files/bucketFiles.ts'
import { readMailbox, type Mailbox } from './adapters/mail/mailbox.ts'
import type { TileService } from './adapters/tiles/proxyTiles.ts'

/** A fixed host, and each of the three numbers behind it. */
function isTileTemplate(text: string): boolean {
  const host = /^https?:\/\/[^/?#{}@]+\/(.+)$/.exec(text)
  const names = [...(host?.[1] ?? '').matchAll(/\{([^}]*)\}/g)].map(([, name]) => name)
  return URL.canParse(text) && ['z', 'x', 'y'].every((name) => names.includes(name)) && names.every((name) => ['z', 'x', 'y'].includes(name ?? ''))
}

const environment = z.object({
  PORT: z.coerce.number().int().min(0).max(65535).default(4310),
  HOST: z.string().min(1).default('127.0.0.1'),
  DATABASE_URL: z.string().regex(/^postgres(ql)?:\/\//, 'must be a postgres:// address (the app role)'),
  DATABASE_OWNER_URL: z.string().regex(/^postgres(ql)?:\/\//, 'must be a postgres:// address (the owner role)'),
  DATABASE_POOL: z.coerce.number().int().min(1).max(200).default(10),
  SESSION_SECRET: z.string().min(32, 'must have at least 32 characters'),
  PUBLIC_URL: z.url('must be the address people open, https://…').optional(),
  SECOND_FACTOR_SECRET: z.string().min(32, 'must have at least 32 characters').optional(),
  SESSIONS_PER_ACCOUNT: z.coerce.number().int().min(1).max(10_000).optional(),
  FARMS_PER_ACCOUNT: z.coerce.number().int().min(1).max(10_000).default(20),
  LOG_FILE: z.string().optional(),
  SEED_DEMO: z.enum(['0', '1']).default('0'),
  DEMO_PASSWORD: z.string().min(8).optional(),
  FIXED_CLOCK: z.iso.datetime({ offset: true }).optional(),
  DATA_DIR: z.string().min(1).default('.data'),
  FILES_FOLDER: z.string().min(1).optional(),
  FILES_QUOTA_MB: z.coerce.number().int().min(1).default(5_000),
  S3_BUCKET: z.string().min(1).optional(),
  S3_ENDPOINT: z.url('must be the address of the store, https://…').optional(),
  S3_REGION: z.string().min(1).default('us-east-1'),
  S3_KEY_ID: z.string().min(1).optional(),
  S3_SECRET: z.string().min(1).optional(),
  SMTP_URL: z.string().regex(/^smtps?:\/\/[^\s]+$/, 'must be the address of a mail server, smtp://… or smtps://…').optional(),
  MAIL_FROM: z.string().refine((text) => readMailbox(text) !== null, 'must be an address, or Name <address>').optional(),
  TILE_URL: z.string().refine(isTileTemplate, 'must be the address of a tile, https://… with {z}, {x} and {y} after the host').optional(),
  TILE_ATTRIBUTION: lineText(200).optional(),
  TILE_MAX_ZOOM: z.coerce.number().int().min(1).max(22).default(19),
}).superRefine((values, context) => {
  if (values.TILE_URL !== undefined && values.TILE_ATTRIBUTION === undefined) {
    context.addIssue({ code: 'custom', path: ['TILE_ATTRIBUTION'], message: 'must be given with TILE_URL: whose pictures they are' })
  }
  if (values.SMTP_URL !== undefined && values.MAIL_FROM === undefined) {
    context.addIssue({ code: 'custom', path: ['MAIL_FROM'], message: 'must be given with SMTP_URL: whom letters come from' })
  }
  if (values.S3_BUCKET === undefined) return
  for (const name of ['S3_KEY_ID', 'S3_SECRET'] as const) {
    if (values[name] === undefined) context.addIssue({ code: 'custom', path: [name], message: 'must be given with S3_BUCKET' })
  }
})

export interface Config {
  port: number
  host: string
  databaseUrl: string
  databaseOwnerUrl: string
  databasePool: number
  sessionSecret: string
  /** What secrets of second factors are sealed with. */
  factorSecret: string
  /** Sessions that one account may have at a time. */
  sessionsPerAccount: number
  publicUrl: string | null
  cookies: CookieConfig
  /** Farms that one account may own. */
  farmsPerAccount: number
  logFile: string | null
  demo: { password: string } | null
  fixedClock: string | null
  files: FilesConfig
  mail: MailConfig
  /** Null where no tile service is named: nothing is then asked from outside. */
  tiles: TileService | null
}

/** How cookies are named and kept. */
export interface CookieConfig {
  /** Whether people reach the server by https alone. */
  secure: boolean
  sessionName: string
  /** What the name of a device's mark begins with. */
  devicePrefix: string
  /** By which a phone is known as a farm's. */
  phoneName: string
}

/**
 * Cookies for an address. By https their names carry the prefixes that a browser takes from this very host (`__Host-`) or by
 * https (`__Secure-`) alone; by plain http it would refuse such names.
 */
export function cookiesOf(publicUrl: string | null): CookieConfig {
  const secure = publicUrl?.startsWith('https:') ?? false
  return {
    secure,
    sessionName: secure ? '__Host-drenchleaf.sid' : 'drenchleaf.sid',
    phoneName: secure ? '__Secure-drenchleaf.phone' : 'drenchleaf.phone',
    devicePrefix: secure ? '__Secure-drenchleaf.device.' : 'drenchleaf.device.',
  }
}

/** How letters go out. */
export interface MailConfig {
  /** Null where none is named: letters are then kept on this machine. */
  smtpUrl: string | null
  from: Mailbox
  /** Where kept letters outlive a restart; null for in memory alone. */
  keptFile: string | null
}

/** Where photos and papers are kept. */
export interface FilesConfig {
  /** On this machine; not used with a bucket. */
  folder: string
  bucket: Bucket | null
  /** Most that one farm may keep, bytes. */
  quotaBytes: number
}

/** Whom kept letters come from; RFC 2606 keeps the name out of the real world. */
const NOBODY: Mailbox = { name: 'Drenchleaf', address: 'register@drenchleaf.invalid' }
const SESSIONS = 5
/** Whoever tries the demo signs in with the same few accounts. */
const DEMO_SESSIONS = 500
const BYTES_PER_MB = 1_000_000

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
  const publicUrl = values.PUBLIC_URL?.replace(/\/$/, '') ?? null
  return {
    port: values.PORT,
    host: values.HOST,
    databaseUrl: values.DATABASE_URL,
    databaseOwnerUrl: values.DATABASE_OWNER_URL,
    databasePool: values.DATABASE_POOL,
    sessionSecret: values.SESSION_SECRET,
    factorSecret: values.SECOND_FACTOR_SECRET ?? values.SESSION_SECRET,
    sessionsPerAccount: values.SESSIONS_PER_ACCOUNT ?? (values.SEED_DEMO === '1' ? DEMO_SESSIONS : SESSIONS),
    publicUrl,
    cookies: cookiesOf(publicUrl),
    farmsPerAccount: values.FARMS_PER_ACCOUNT,
    logFile: values.LOG_FILE ?? null,
    demo: values.SEED_DEMO === '1' && values.DEMO_PASSWORD ? { password: values.DEMO_PASSWORD } : null,
    fixedClock: values.FIXED_CLOCK ?? null,
    files: readFiles(values),
    mail: readMail(values),
    tiles: readTiles(values),
  }
}

function readMail({ SMTP_URL: smtpUrl, MAIL_FROM: from, DATA_DIR: folder }: z.output<typeof environment>): MailConfig {
  return { smtpUrl: smtpUrl ?? null, from: readMailbox(from ?? '') ?? NOBODY, keptFile: join(folder, 'mail.jsonl') }
}

function readFiles(values: z.output<typeof environment>): FilesConfig {
  const { S3_BUCKET: name, S3_KEY_ID: keyId, S3_SECRET: secret } = values
  const isWhole = name !== undefined && keyId !== undefined && secret !== undefined
  return {
    folder: values.FILES_FOLDER ?? join(values.DATA_DIR, 'files'),
    bucket: isWhole ? { name, keyId, secret, endpoint: values.S3_ENDPOINT ?? null, region: values.S3_REGION } : null,
    quotaBytes: values.FILES_QUOTA_MB * BYTES_PER_MB,
  }
}

function readTiles({ TILE_URL: template, TILE_ATTRIBUTION: attribution, TILE_MAX_ZOOM: maxZoom }: z.output<typeof environment>): TileService | null {
  return template === undefined || attribution === undefined ? null : { template, attribution, maxZoom }
}
