import { z } from 'zod'

/** What a server offers to its pages. */
export const configSchema = z.object({
  /** Pictures of the ground by a tile service: whose they are, and how close they go; null where none is set up. */
  imagery: z.object({ attribution: z.string(), maxZoom: z.number().int() }).nullable(),
  demo: z.boolean(),
  /** No mail server is named: letters go no further than the server's own machine. */
  keepsMail: z.boolean(),
})
export type ClientConfig = z.infer<typeof configSchema>
