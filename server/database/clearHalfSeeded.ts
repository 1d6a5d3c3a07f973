import { createOwnerSource } from './dataSource.ts'

/**
 * Empties a demo database whose first filling broke off half way, so that it is filled again from the start. It looks for
 * accounts without the mark that is written last; a database filled whole is never touched.
 */
export async function clearHalfSeeded(ownerUrl: string): Promise<void> {
  const source = await createOwnerSource(ownerUrl).initialize()
  try {
    const [house]: [{ stands: boolean }] = await source.query("SELECT to_regclass('public.demo_seed') IS NOT NULL AS stands")
    if (!house.stands) return
    const [state]: [{ broken: boolean }] = await source.query('SELECT EXISTS (SELECT 1 FROM accounts) AND NOT EXISTS (SELECT 1 FROM demo_seed) AS broken')
    if (!state.broken) return
    const { length } = source.migrations
    for (let undone = 0; undone < length; undone += 1) await source.undoLastMigration()
  } finally {
    await source.destroy()
  }
}
