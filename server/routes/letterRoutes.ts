import { farmParamsSchema, pageOf, pageQuerySchema, thingParamsSchema } from '../../shared/contract/common.ts'
import { createInvitationSchema, invitationSchema, onInvitationSchema } from '../../shared/contract/invitation.ts'
import { letterSchema, resendLetterSchema } from '../../shared/contract/letter.ts'
import { invite, listInvitations, resendInvitation, withdrawInvitation } from '../services/invitations/invitations.ts'
import { listLetters, resendLetter } from '../services/mail/farmLetters.ts'
import { defineRoute } from './defineRoute.ts'

const OWNER = ['owner'] as const

export const letterRoutes = [
  defineRoute({
    method: 'get', path: '/farms/:farmId/invitations', summary: 'Invitations onto the farm that wait.', roles: OWNER,
    params: farmParamsSchema, query: pageQuerySchema, answer: pageOf(invitationSchema),
    run: async ({ services, actor, query }) => ({ body: await listInvitations(services, actor, query) }),
  }),
  defineRoute({
    method: 'post', path: '/farms/:farmId/invitations', summary: 'Ask somebody onto the farm by letter.', roles: OWNER,
    guardsPassword: true, params: farmParamsSchema, body: createInvitationSchema, answer: invitationSchema,
    run: async ({ services, actor, body }) => {
      const { made, invitation } = await invite(services, actor, body)
      return { status: made ? 201 : 200, body: invitation }
    },
  }),
  defineRoute({
    method: 'post', path: '/farms/:farmId/invitations/:id/resend', summary: 'Write the letter again, with a new link.', roles: OWNER,
    params: thingParamsSchema, body: onInvitationSchema, answer: invitationSchema,
    run: async ({ services, actor, params, body }) => ({ body: await resendInvitation(services, actor, params.id, body.revision) }),
  }),
  defineRoute({
    method: 'post', path: '/farms/:farmId/invitations/:id/withdraw', summary: 'Take an invitation back; its link works no more.', roles: OWNER,
    params: thingParamsSchema, body: onInvitationSchema, answer: invitationSchema,
    run: async ({ services, actor, params, body }) => ({ body: await withdrawInvitation(services, actor, params.id, body.revision) }),
  }),
  defineRoute({
    method: 'get', path: '/farms/:farmId/letters', summary: 'Letters of the farm, newest first.', roles: OWNER,
    params: farmParamsSchema, query: pageQuerySchema, answer: pageOf(letterSchema),
    run: async ({ services, actor, query }) => ({ body: await listLetters(services, actor, query) }),
  }),
  defineRoute({
    method: 'post', path: '/farms/:farmId/letters/:id/resend', summary: 'Send a letter again, as a new one.', roles: OWNER,
    params: thingParamsSchema, body: resendLetterSchema, answer: letterSchema,
    run: async ({ services, actor, params, body }) => {
      const { made, letter } = await resendLetter(services, actor, params.id, body.id)
      return { status: made ? 201 : 200, body: letter }
    },
  }),
]
