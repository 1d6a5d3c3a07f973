import type { Config } from '../config.ts'

/** Where people reach this server, without a slash at the end; never taken from what a request claims. */
export function publicAddress(config: Pick<Config, 'publicUrl' | 'host' | 'port'>): string {
  return config.publicUrl ?? `http://${config.host}:${config.port}`
}
