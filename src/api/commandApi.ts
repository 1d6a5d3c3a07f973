import { z } from 'zod'
import { bedSchema } from '../../shared/contract/bed.ts'
import { blockSchema } from '../../shared/contract/block.ts'
import { blocksChangedSchema } from '../../shared/contract/blockChanges.ts'
import { blocksImportedSchema } from '../../shared/contract/blockImport.ts'
import { calibrationSchema } from '../../shared/contract/calibration.ts'
import { certificateSchema } from '../../shared/contract/certificate.ts'
import { farmSchema, sprayerSchema } from '../../shared/contract/farm.ts'
import { invitationSchema } from '../../shared/contract/invitation.ts'
import { letterSchema } from '../../shared/contract/letter.ts'
import { farmEventSchema } from '../../shared/contract/farmEvent.ts'
import { grantSchema } from '../../shared/contract/grant.ts'
import { groundSchema, siteSchema } from '../../shared/contract/ground.ts'
import { jobSchema } from '../../shared/contract/job.ts'
import { lotSchema, materialSchema } from '../../shared/contract/input.ts'
import { plantingSchema } from '../../shared/contract/planting.ts'
import { factorAskedSchema, personPaperSchema, personSchema } from '../../shared/contract/person.ts'
import { recordSchema } from '../../shared/contract/record.ts'
import { signManyAnswerSchema } from '../../shared/contract/recordChanges.ts'
import { savedFilterSchema } from '../../shared/contract/savedFilter.ts'
import { startSchema } from '../../shared/contract/start.ts'
import { seasonPlanSchema } from '../../shared/contract/seasonPlan.ts'
import { sharedPhoneSchema } from '../../shared/contract/sharedPhone.ts'
import type { Command, CommandAnswers, CommandKind } from './commandTypes.ts'
import { http } from './http.ts'

interface Door {
  method: 'post' | 'put' | 'patch' | 'del'
  path: (farmId: string, id: string) => string
  answer: z.ZodType
}

const DOORS: Record<CommandKind, Door> = {
  'farm.create': { method: 'post', path: () => '/farms', answer: farmSchema },
  'block.create': { method: 'post', path: (farmId) => `/farms/${farmId}/blocks`, answer: blockSchema },
  'block.update': { method: 'patch', path: (farmId, id) => `/farms/${farmId}/blocks/${id}`, answer: blockSchema },
  'block.split': { method: 'post', path: (farmId, id) => `/farms/${farmId}/blocks/${id}/split`, answer: blocksChangedSchema },
  'block.merge': { method: 'post', path: (farmId) => `/farms/${farmId}/blocks/merge`, answer: blocksChangedSchema },
  'block.reopen': { method: 'post', path: (farmId, id) => `/farms/${farmId}/blocks/${id}/reopen`, answer: blocksChangedSchema },
  'block.land': { method: 'put', path: (farmId, id) => `/farms/${farmId}/blocks/${id}/land`, answer: blockSchema },
  'planting.create': { method: 'post', path: (farmId) => `/farms/${farmId}/plantings`, answer: plantingSchema },
  'planting.update': { method: 'patch', path: (farmId, id) => `/farms/${farmId}/plantings/${id}`, answer: plantingSchema },
  'bed.create': { method: 'post', path: (farmId) => `/farms/${farmId}/beds`, answer: bedSchema },
  'bed.update': { method: 'patch', path: (farmId, id) => `/farms/${farmId}/beds/${id}`, answer: bedSchema },
  'event.create': { method: 'post', path: (farmId) => `/farms/${farmId}/farm-events`, answer: farmEventSchema },
  'event.withdraw': { method: 'post', path: (farmId, id) => `/farms/${farmId}/farm-events/${id}/withdraw`, answer: farmEventSchema },
  'site.create': { method: 'post', path: (farmId) => `/farms/${farmId}/sites`, answer: siteSchema },
  'site.change': { method: 'patch', path: (farmId, id) => `/farms/${farmId}/sites/${id}`, answer: siteSchema },
  'ground.create': { method: 'post', path: (farmId) => `/farms/${farmId}/ground`, answer: groundSchema },
  'ground.change': { method: 'patch', path: (farmId, id) => `/farms/${farmId}/ground/${id}`, answer: groundSchema },
  'block.import': { method: 'post', path: (farmId) => `/farms/${farmId}/blocks/import`, answer: blocksImportedSchema },
  'material.create': { method: 'post', path: (farmId) => `/farms/${farmId}/materials`, answer: materialSchema },
  'lot.create': { method: 'post', path: (farmId) => `/farms/${farmId}/lots`, answer: lotSchema },
  'lot.count': { method: 'post', path: (farmId, id) => `/farms/${farmId}/lots/${id}/count`, answer: lotSchema },
  'sprayer.create': { method: 'post', path: (farmId) => `/farms/${farmId}/sprayers`, answer: sprayerSchema },
  'sprayer.update': { method: 'patch', path: (farmId, id) => `/farms/${farmId}/sprayers/${id}`, answer: sprayerSchema },
  'sprayer.retire': { method: 'post', path: (farmId, id) => `/farms/${farmId}/sprayers/${id}/retire`, answer: sprayerSchema },
  'calibration.create': { method: 'post', path: (farmId) => `/farms/${farmId}/calibrations`, answer: calibrationSchema },
  'calibration.withdraw': { method: 'post', path: (farmId, id) => `/farms/${farmId}/calibrations/${id}/withdraw`, answer: calibrationSchema },
  'certificate.add': { method: 'post', path: (farmId) => `/farms/${farmId}/certificates`, answer: certificateSchema },
  'certificate.change': { method: 'patch', path: (farmId, id) => `/farms/${farmId}/certificates/${id}`, answer: certificateSchema },
  'certificate.withdraw': { method: 'post', path: (farmId, id) => `/farms/${farmId}/certificates/${id}/withdraw`, answer: certificateSchema },
  'farm.update': { method: 'patch', path: (farmId) => `/farms/${farmId}`, answer: farmSchema },
  'start.update': { method: 'patch', path: (farmId) => `/farms/${farmId}/start`, answer: startSchema },
  'practice.make': { method: 'post', path: () => '/practice-farm', answer: farmSchema },
  'practice.away': { method: 'del', path: () => '/practice-farm', answer: z.undefined() },
  'invitation.create': { method: 'post', path: (farmId) => `/farms/${farmId}/invitations`, answer: invitationSchema },
  'invitation.resend': { method: 'post', path: (farmId, id) => `/farms/${farmId}/invitations/${id}/resend`, answer: invitationSchema },
  'invitation.withdraw': { method: 'post', path: (farmId, id) => `/farms/${farmId}/invitations/${id}/withdraw`, answer: invitationSchema },
  'letter.resend': { method: 'post', path: (farmId, id) => `/farms/${farmId}/letters/${id}/resend`, answer: letterSchema },
  'person.add': { method: 'post', path: (farmId) => `/farms/${farmId}/people`, answer: personSchema },
  'person.change': { method: 'patch', path: (farmId, id) => `/farms/${farmId}/people/${id}`, answer: personSchema },
  'person.pin': { method: 'put', path: (farmId, id) => `/farms/${farmId}/people/${id}/pin`, answer: personSchema },
  'person.endSessions': { method: 'post', path: (farmId, id) => `/farms/${farmId}/people/${id}/end-sessions`, answer: z.undefined() },
  'person.resetFactor': { method: 'post', path: (farmId, id) => `/farms/${farmId}/people/${id}/reset-factor`, answer: z.undefined() },
  'farm.askFactor': { method: 'put', path: (farmId) => `/farms/${farmId}/second-factor`, answer: factorAskedSchema },
  'phone.enrol': { method: 'post', path: (farmId) => `/farms/${farmId}/shared-phones`, answer: sharedPhoneSchema },
  'phone.revoke': { method: 'post', path: (farmId, id) => `/farms/${farmId}/shared-phones/${id}/revoke`, answer: z.undefined() },
  'paper.add': { method: 'post', path: (farmId) => `/farms/${farmId}/person-papers`, answer: personPaperSchema },
  'paper.change': { method: 'put', path: (farmId, id) => `/farms/${farmId}/person-papers/${id}`, answer: personPaperSchema },
  'record.create': { method: 'post', path: (farmId) => `/farms/${farmId}/records`, answer: recordSchema },
  'record.update': { method: 'put', path: (farmId, id) => `/farms/${farmId}/records/${id}`, answer: recordSchema },
  'record.sign': { method: 'post', path: (farmId, id) => `/farms/${farmId}/records/${id}/sign`, answer: recordSchema },
  'record.signMany': { method: 'post', path: (farmId) => `/farms/${farmId}/records/sign`, answer: signManyAnswerSchema },
  'record.amend': { method: 'post', path: (farmId, id) => `/farms/${farmId}/records/${id}/amend`, answer: recordSchema },
  'record.withdraw': { method: 'post', path: (farmId, id) => `/farms/${farmId}/records/${id}/withdraw`, answer: recordSchema },
  'record.review': { method: 'post', path: (farmId, id) => `/farms/${farmId}/records/${id}/review`, answer: recordSchema },
  'record.discard': { method: 'post', path: (farmId, id) => `/farms/${farmId}/records/${id}/discard`, answer: z.undefined() },
  'plan.create': { method: 'post', path: (farmId) => `/farms/${farmId}/season-plans`, answer: seasonPlanSchema },
  'plan.update': { method: 'put', path: (farmId, id) => `/farms/${farmId}/season-plans/${id}`, answer: seasonPlanSchema },
  'plan.end': { method: 'post', path: (farmId, id) => `/farms/${farmId}/season-plans/${id}/end`, answer: seasonPlanSchema },
  'plan.reopen': { method: 'post', path: (farmId, id) => `/farms/${farmId}/season-plans/${id}/reopen`, answer: seasonPlanSchema },
  'job.move': { method: 'post', path: (farmId, id) => `/farms/${farmId}/jobs/${id}/move`, answer: jobSchema },
  'job.skip': { method: 'post', path: (farmId, id) => `/farms/${farmId}/jobs/${id}/skip`, answer: jobSchema },
  'job.unskip': { method: 'post', path: (farmId, id) => `/farms/${farmId}/jobs/${id}/unskip`, answer: jobSchema },
  'filter.keep': { method: 'post', path: (farmId) => `/farms/${farmId}/saved-filters`, answer: savedFilterSchema },
  'grant.give': { method: 'post', path: (farmId) => `/farms/${farmId}/grants`, answer: grantSchema },
  'grant.change': { method: 'patch', path: (farmId, id) => `/farms/${farmId}/grants/${id}`, answer: grantSchema },
  'grant.end': { method: 'post', path: (farmId, id) => `/farms/${farmId}/grants/${id}/end`, answer: grantSchema },
  'filter.forget': { method: 'del', path: (farmId, id) => `/farms/${farmId}/saved-filters/${id}`, answer: z.undefined() },
}

/**
 * Sends one command to the address of its kind.
 * @throws {ApiError} when refused, {NetworkError} when no answer came.
 */
export async function sendCommand<Kind extends CommandKind>(command: Command<Kind>): Promise<CommandAnswers[Kind]> {
  const door = DOORS[command.kind]
  const path = door.path(command.farmId, command.id)
  const answer = await (door.method === 'del' ? http.del(path, door.answer) : http[door.method](path, command.body, door.answer))
  return answer as CommandAnswers[Kind]
}
