import { z } from 'zod'
import { configSchema } from '../../shared/contract/config.ts'
import { checkCodeAnswerSchema } from '../../shared/contract/record.ts'
import { notFound } from '../errors.ts'
import { findCheckCode } from '../services/findCheckCode.ts'
import { defineRoute } from './defineRoute.ts'

const wholeNumber = (max: number) => z.string().regex(/^\d{1,7}$/).transform(Number).pipe(z.number().max(max))
const tileParams = z.strictObject({ z: wholeNumber(22), x: wholeNumber(2 ** 22 - 1), y: wholeNumber(2 ** 22 - 1) })
const DAY_S = 86_400

export const openRoutes = [
  defineRoute({
    method: 'get', path: '/health', summary: 'Whether the server serves.', roles: 'everybody',
    answer: z.object({ status: z.literal('ok') }),
    run: async () => ({ body: { status: 'ok' as const } }),
  }),
  defineRoute({
    method: 'get', path: '/config', summary: 'What this server offers to its pages.', roles: 'everybody',
    answer: configSchema,
    run: async ({ services }) => ({ body: { imagery: services.tiles && { attribution: services.tiles.attribution, maxZoom: services.tiles.maxZoom }, demo: services.config.demo !== null, keepsMail: services.keptMail !== null } }),
  }),
  defineRoute({
    method: 'get', path: '/check/:code', summary: 'Whether a signed entry stands under a check code.', roles: 'everybody',
    params: z.strictObject({ code: z.string().max(80) }), answer: checkCodeAnswerSchema,
    run: async ({ services, params }) => ({ body: await findCheckCode(services, params.code) }),
  }),
  defineRoute({
    method: 'get', path: '/tiles/:z/:x/:y', summary: 'A square of the imagery that this server is set up with.', roles: 'account',
    params: tileParams, answer: z.null(), contentType: 'image/*',
    run: async ({ services, params, response }) => {
      if (!services.tiles) throw notFound()
      const tile = await services.tiles.read(params.z, params.x, params.y)
      response.type(tile.contentType).set('Cache-Control', `private, max-age=${DAY_S}`).send(tile.bytes)
      return 'sent'
    },
  }),
]
