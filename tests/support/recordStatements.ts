import pg from 'pg'

/** A statement as it went to the database. */
export interface Recorded { text: string; params: unknown[] }

/** Every statement that this process sends while the work is done, but those of the session store, which the baselines have too. */
export async function recordStatements(work: () => Promise<unknown>): Promise<Recorded[]> {
  const recorded: Recorded[] = []
  const { query } = pg.Client.prototype
  const spy = function (this: pg.Client, ...args: unknown[]): unknown {
    const text = typeof args[0] === 'string' ? args[0] : (args[0] as { text: string }).text
    const given = typeof args[0] === 'string' ? args[1] : (args[0] as { values?: unknown }).values
    if (!text.includes('"sessions"')) recorded.push({ text, params: Array.isArray(given) ? given : [] })
    return Reflect.apply(query, this, args)
  }
  pg.Client.prototype.query = spy as typeof query
  try {
    await work()
  } finally {
    pg.Client.prototype.query = query
  }
  return recorded
}
