import { certificateSchema } from '../../shared/contract/certificate.ts'
import { addCertificateSchema, changeCertificateSchema, withdrawCertificateSchema } from '../../shared/contract/certificateChanges.ts'
import { farmParamsSchema, thingParamsSchema } from '../../shared/contract/common.ts'
import { addCertificate, changeCertificate, withdrawCertificate } from '../services/farms/certificates.ts'
import { defineRoute } from './defineRoute.ts'
import { LEADERS } from './roleGroups.ts'

export const certificateRoutes = [
  defineRoute({
    method: 'post', path: '/farms/:farmId/certificates', summary: 'Write a certificate down: from its first day it stands in place of the one before.', roles: LEADERS,
    params: farmParamsSchema, body: addCertificateSchema, answer: certificateSchema,
    run: async ({ services, actor, body }) => {
      const { made, certificate } = await addCertificate(services, actor, body)
      return { status: made ? 201 : 200, body: certificate }
    },
  }),
  defineRoute({
    method: 'patch', path: '/farms/:farmId/certificates/:id', summary: 'Correct what was written down of a certificate.', roles: LEADERS,
    params: thingParamsSchema, body: changeCertificateSchema, answer: certificateSchema,
    run: async ({ services, actor, params, body }) => ({ body: await changeCertificate(services, actor, params.id, body) }),
  }),
  defineRoute({
    method: 'post', path: '/farms/:farmId/certificates/:id/withdraw', summary: 'Take a certificate back, with the reason; it stays readable and is printed nowhere.', roles: LEADERS,
    params: thingParamsSchema, body: withdrawCertificateSchema, answer: certificateSchema,
    run: async ({ services, actor, params, body }) => ({ body: await withdrawCertificate(services, actor, params.id, body) }),
  }),
]
