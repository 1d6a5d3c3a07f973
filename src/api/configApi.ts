import { configSchema, type ClientConfig } from '../../shared/contract/config.ts'
import { http } from './http.ts'

/** What this server offers. */
export const configApi = {
  read: (): Promise<ClientConfig> => http.get('/config', configSchema),
}
