import { z } from 'zod'
import { http } from './http.ts'

const configSchema = z.object({ tiles: z.boolean(), demo: z.boolean() })
export type ClientConfig = z.infer<typeof configSchema>

/** What this server offers. */
export const configApi = {
  read: (): Promise<ClientConfig> => http.get('/config', configSchema),
}
