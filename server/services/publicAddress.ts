import type { Config } from '../config.ts'

/** Where people reach this server, without a slash at the end; never taken from what a request claims. */
export function publicAddress(config: Pick<Config, 'publicUrl' | 'host' | 'port'>): string {
  const host = config.host.includes(':') ? `[${config.host}]` : config.host
  return config.publicUrl ?? `http://${host}:${config.port}`
}
