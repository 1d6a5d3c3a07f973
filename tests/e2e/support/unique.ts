import { randomUUID } from 'node:crypto'

/** A short code nobody else has, so that a test finds its own thing whatever was made before: `prefix` and six letters or figures. */
export function unique(prefix: string): string {
  return `${prefix}${randomUUID().replaceAll('-', '').slice(0, 6).toUpperCase()}`
}
