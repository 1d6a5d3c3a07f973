import pino, { type Logger } from 'pino'

/**
 * JSON lines: error = someone must act, warn = healed, info = a state changed.
 * @param file where to write; null writes to standard error.
 */
export function createLogger(file: string | null, level = 'info'): Logger {
  const redact = ['req.headers.cookie', 'req.headers.authorization', 'res.headers["set-cookie"]']
  return pino({ level, redact }, pino.destination({ dest: file ?? 2, mkdir: true, sync: file === null }))
}
