import { z } from 'zod'
import { farmParamsSchema, pageOf, pageQuerySchema, thingParamsSchema } from '../../shared/contract/common.ts'
import { addPersonSchema, askFactorSchema, changePersonSchema, factorAskedSchema, personSchema, proveOwnerSchema, setPinSchema } from '../../shared/contract/person.ts'
import { logSecurity } from '../middleware/logSecurity.ts'
import { addPerson } from '../services/people/addPerson.ts'
import { askFactor, isFactorAsked } from '../services/people/askFactor.ts'
import { changePerson } from '../services/people/changePerson.ts'
import { endMemberSessions, resetMemberFactor } from '../services/people/memberAccount.ts'
import { getPerson, listPeople } from '../services/people/presentPeople.ts'
import { setPin } from '../services/people/setPin.ts'
import { defineRoute } from './defineRoute.ts'
import { FARM_PEOPLE } from './roleGroups.ts'

const OWNER = ['owner'] as const

export const peopleRoutes = [
  defineRoute({
    method: 'get', path: '/farms/:farmId/people', summary: 'People of the farm, by name.', roles: FARM_PEOPLE,
    params: farmParamsSchema, query: pageQuerySchema, answer: pageOf(personSchema),
    run: async ({ services, actor, query }) => ({ body: await listPeople(services, actor, query) }),
  }),
  defineRoute({
    method: 'post', path: '/farms/:farmId/people', summary: 'Take in somebody without e-mail, with a PIN for the shared phones.', roles: OWNER,
    guardsPassword: true, params: farmParamsSchema, body: addPersonSchema, answer: personSchema,
    run: async ({ services, actor, body }) => {
      const { made, person } = await addPerson(services, actor, body)
      return { status: made ? 201 : 200, body: person }
    },
  }),
  defineRoute({
    method: 'get', path: '/farms/:farmId/people/:id', summary: 'One person of the farm.', roles: FARM_PEOPLE,
    params: thingParamsSchema, answer: personSchema,
    run: async ({ services, actor, params }) => ({ body: await getPerson(services, actor, params.id) }),
  }),
  defineRoute({
    method: 'patch', path: '/farms/:farmId/people/:id', summary: 'Change name or role, let somebody go or take them in again; it acts at their next request.', roles: OWNER,
    guardsPassword: true, params: thingParamsSchema, body: changePersonSchema, answer: personSchema,
    run: async ({ services, actor, params, body, request }) => {
      const person = await changePerson(services, actor, params.id, body)
      logSecurity(services, request, 'rights.changed', { code: params.id })
      return { body: person }
    },
  }),
  defineRoute({
    method: 'put', path: '/farms/:farmId/people/:id/pin', summary: 'Give somebody without e-mail a PIN, or another one.', roles: OWNER,
    guardsPassword: true, params: thingParamsSchema, body: setPinSchema, answer: personSchema,
    run: async ({ services, actor, params, body }) => ({ body: await setPin(services, actor, params.id, body) }),
  }),
  defineRoute({
    method: 'post', path: '/farms/:farmId/people/:id/end-sessions', summary: 'End all sessions of a member, as after a phone was lost.', roles: OWNER,
    guardsPassword: true, params: thingParamsSchema, body: proveOwnerSchema, answer: z.null(),
    run: async ({ services, actor, params, body }) => {
      await endMemberSessions(services, actor, params.id, body.password)
      return { status: 204, body: null }
    },
  }),
  defineRoute({
    method: 'post', path: '/farms/:farmId/people/:id/reset-factor', summary: 'Take a member’s second factor away, as after an authenticator was lost.', roles: OWNER,
    guardsPassword: true, params: thingParamsSchema, body: proveOwnerSchema, answer: z.null(),
    run: async ({ services, actor, params, body, request }) => {
      await resetMemberFactor(services, actor, params.id, body.password)
      logSecurity(services, request, 'factor.changed', { code: params.id })
      return { status: 204, body: null }
    },
  }),
  defineRoute({
    method: 'get', path: '/farms/:farmId/second-factor', summary: 'Whether the farm asks a second factor of owner, manager and certifier.', roles: FARM_PEOPLE,
    params: farmParamsSchema, answer: factorAskedSchema,
    run: async ({ services, actor }) => ({ body: await isFactorAsked(services, actor) }),
  }),
  defineRoute({
    method: 'put', path: '/farms/:farmId/second-factor', summary: 'Ask a second factor of owner, manager and certifier, or no longer.', roles: OWNER,
    guardsPassword: true, params: farmParamsSchema, body: askFactorSchema, answer: factorAskedSchema,
    run: async ({ services, actor, body }) => ({ body: await askFactor(services, actor, body) }),
  }),
]
