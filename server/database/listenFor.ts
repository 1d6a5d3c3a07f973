import pg from 'pg'

/**
 * Hears what the database tells on a channel once a transaction commits, on a connection of its own.
 * @param ended hears that the connection broke; whoever listens then opens another.
 */
export async function listenFor(url: string, channel: string, { heard, ended }: { heard: () => void; ended: (error: unknown) => void }): Promise<{ close(): Promise<void> }> {
  const client = new pg.Client({ connectionString: url, application_name: 'drenchleaf ear', keepAlive: true })
  client.on('notification', heard)
  client.on('error', ended)
  await client.connect()
  await client.query(`LISTEN ${pg.escapeIdentifier(channel)}`)
  return { close: () => client.end() }
}
