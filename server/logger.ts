import pino, { type Logger } from 'pino'

/**
 * JSON lines: error = someone must act, warn = healed, info = a state changed.
 * @param file where to write; null writes to standard error.
 */
export function createLogger(file: string | null, level = 'info'): Logger {
  const redact = ['req.headers.cookie', 'req.headers.authorization', 'res.headers["set-cookie"]']
  return pino({ level, redact, serializers: { err: describeError } }, pino.destination({ dest: file ?? 2, mkdir: true, sync: file === null, mode: 0o600 }))
}

/** What is kept of an error: never the statement and its parameters, which may hold what people wrote. */
function describeError(error: unknown): object {
  if (!(error instanceof Error)) return { message: String(error) }
  const code = 'code' in error ? String(error.code) : undefined
  return { type: error.name, message: error.message, stack: error.stack, ...(code !== undefined && { code }) }
}
