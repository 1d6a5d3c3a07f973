import { farmParamsSchema, pageOf, pageQuerySchema, thingParamsSchema } from '../../shared/contract/common.ts'
import { changeGroundSchema, changeSiteSchema, createGroundSchema, createSiteSchema, groundSchema, siteSchema } from '../../shared/contract/ground.ts'
import { changeGround, createGround, listGround } from '../services/ground/groundFeatures.ts'
import { changeSite, createSite, listSites } from '../services/ground/sites.ts'
import { defineRoute } from './defineRoute.ts'
import { EVERY_ROLE, LEADERS } from './roleGroups.ts'

export const groundRoutes = [
  defineRoute({
    method: 'get', path: '/farms/:farmId/sites', summary: 'Sites to keep clear of with their distances, by name; ended ones too.', roles: EVERY_ROLE,
    params: farmParamsSchema, query: pageQuerySchema, answer: pageOf(siteSchema),
    run: async ({ services, actor, query }) => ({ body: await listSites(services, actor, query) }),
  }),
  defineRoute({
    method: 'post', path: '/farms/:farmId/sites', summary: 'Write down a site to keep clear of.', roles: LEADERS,
    params: farmParamsSchema, body: createSiteSchema, answer: siteSchema,
    run: async ({ services, actor, body }) => {
      const { made, site } = await createSite(services, actor, body)
      return { status: made ? 201 : 200, body: site }
    },
  }),
  defineRoute({
    method: 'patch', path: '/farms/:farmId/sites/:id', summary: 'Change or end a site.', roles: LEADERS,
    params: thingParamsSchema, body: changeSiteSchema, answer: siteSchema,
    run: async ({ services, actor, params, body }) => ({ body: await changeSite(services, actor, params.id, body) }),
  }),
  defineRoute({
    method: 'get', path: '/farms/:farmId/ground', summary: 'The farm’s own ground plan: tracks, water, buildings, hedges; what ended too.', roles: EVERY_ROLE,
    params: farmParamsSchema, query: pageQuerySchema, answer: pageOf(groundSchema),
    run: async ({ services, actor, query }) => ({ body: await listGround(services, actor, query) }),
  }),
  defineRoute({
    method: 'post', path: '/farms/:farmId/ground', summary: 'Draw a piece of the ground plan.', roles: LEADERS,
    params: farmParamsSchema, body: createGroundSchema, answer: groundSchema,
    run: async ({ services, actor, body }) => {
      const { made, feature } = await createGround(services, actor, body)
      return { status: made ? 201 : 200, body: feature }
    },
  }),
  defineRoute({
    method: 'patch', path: '/farms/:farmId/ground/:id', summary: 'Change or end a piece of the ground plan.', roles: LEADERS,
    params: thingParamsSchema, body: changeGroundSchema, answer: groundSchema,
    run: async ({ services, actor, params, body }) => ({ body: await changeGround(services, actor, params.id, body) }),
  }),
]
