import { z } from 'zod'

/** One e-mail address, lower case: it names an account. */
export const emailSchema = z.string().trim().toLowerCase().max(254, { error: 'text.too_long' }).pipe(z.email({ error: 'email.format' }))
