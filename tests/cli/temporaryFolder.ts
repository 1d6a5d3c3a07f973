import { chmodSync, mkdtempSync, realpathSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterAll } from 'vitest'

/** A folder for one test file, gone after it. */
export function temporaryFolder(): string {
  const folder = realpathSync(mkdtempSync(join(tmpdir(), 'drenchleaf-cli-')))
  chmodSync(folder, 0o711) // a database started by root runs as another user
  afterAll(() => rmSync(folder, { recursive: true, force: true, maxRetries: 5 }))
  return folder
}
