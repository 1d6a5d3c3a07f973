import { createHmac } from 'node:crypto'

const LENGTH = 16

/** An e-mail as it stands in the log: the same one always alike, never readable back without the server's secret. */
export function emailDigest(secret: string, email: string): string {
  return createHmac('sha256', secret).update(`log ${email.trim().toLowerCase()}`).digest('hex').slice(0, LENGTH)
}
