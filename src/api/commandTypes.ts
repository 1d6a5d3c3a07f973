import type { z } from 'zod'
import type { Bed, createBedSchema, updateBedSchema } from '../../shared/contract/bed.ts'
import type { Block, createBlockSchema } from '../../shared/contract/block.ts'
import type { BlocksChanged, mergeBlocksSchema, reopenBlockSchema, splitBlockSchema, updateBlockSchema } from '../../shared/contract/blockChanges.ts'
import type { BlocksImported, importBlocksSchema } from '../../shared/contract/blockImport.ts'
import type { Certificate } from '../../shared/contract/certificate.ts'
import type { addCertificateSchema, changeCertificateSchema, withdrawCertificateSchema } from '../../shared/contract/certificateChanges.ts'
import type { Calibration, createCalibrationSchema, retireSprayerSchema, withdrawCalibrationSchema } from '../../shared/contract/calibration.ts'
import type { createFarmSchema, createSprayerSchema, Farm, Sprayer, updateSprayerSchema } from '../../shared/contract/farm.ts'
import type { updateFarmSchema } from '../../shared/contract/farmChanges.ts'
import type { createFarmEventSchema, FarmEvent, withdrawFarmEventSchema } from '../../shared/contract/farmEvent.ts'
import type { changeGrantSchema, endGrantSchema, giveGrantSchema, Grant } from '../../shared/contract/grant.ts'
import type { changeGroundSchema, changeSiteSchema, createGroundSchema, createSiteSchema, GroundFeature, Site } from '../../shared/contract/ground.ts'
import type { countLotSchema, createLotSchema, createMaterialSchema, Lot, Material } from '../../shared/contract/input.ts'
import type { Job, moveJobSchema, skipJobSchema, unskipJobSchema } from '../../shared/contract/job.ts'
import type { createInvitationSchema, Invitation, onInvitationSchema } from '../../shared/contract/invitation.ts'
import type { putLandSchema } from '../../shared/contract/land.ts'
import type { Letter, resendLetterSchema } from '../../shared/contract/letter.ts'
import type {
  addPaperSchema, addPersonSchema, askFactorSchema, changePaperSchema, changePersonSchema, Person, PersonPaper, proveOwnerSchema, setPinSchema,
} from '../../shared/contract/person.ts'
import type { enrolPhoneSchema, SharedPhone } from '../../shared/contract/sharedPhone.ts'
import type { createPlantingSchema, Planting, updatePlantingSchema } from '../../shared/contract/planting.ts'
import type { ApplicationRecord } from '../../shared/contract/record.ts'
import type {
  amendRecordSchema, createRecordSchema, discardRecordSchema, reviewRecordSchema, SignManyAnswer, signManySchema, signRecordSchema, updateRecordSchema, withdrawRecordSchema,
} from '../../shared/contract/recordChanges.ts'
import type { createPlanSchema, endPlanSchema, reopenPlanSchema, SeasonPlan, updatePlanSchema } from '../../shared/contract/seasonPlan.ts'
import type { createSavedFilterSchema, SavedFilter } from '../../shared/contract/savedFilter.ts'
import type { Start, updateStartSchema } from '../../shared/contract/start.ts'

/** What each kind of command carries. */
export interface CommandBodies {
  'farm.create': z.input<typeof createFarmSchema>
  'block.create': z.input<typeof createBlockSchema>
  'block.update': z.input<typeof updateBlockSchema>
  'block.split': z.input<typeof splitBlockSchema>
  'block.merge': z.input<typeof mergeBlocksSchema>
  'block.reopen': z.input<typeof reopenBlockSchema>
  'block.land': z.input<typeof putLandSchema>
  'planting.create': z.input<typeof createPlantingSchema>
  'planting.update': z.input<typeof updatePlantingSchema>
  'bed.create': z.input<typeof createBedSchema>
  'bed.update': z.input<typeof updateBedSchema>
  'event.create': z.input<typeof createFarmEventSchema>
  'event.withdraw': z.input<typeof withdrawFarmEventSchema>
  'site.create': z.input<typeof createSiteSchema>
  'site.change': z.input<typeof changeSiteSchema>
  'ground.create': z.input<typeof createGroundSchema>
  'ground.change': z.input<typeof changeGroundSchema>
  'block.import': z.input<typeof importBlocksSchema>
  'material.create': z.input<typeof createMaterialSchema>
  'lot.create': z.input<typeof createLotSchema>
  'lot.count': z.input<typeof countLotSchema>
  'sprayer.create': z.input<typeof createSprayerSchema>
  'sprayer.update': z.input<typeof updateSprayerSchema>
  'sprayer.retire': z.input<typeof retireSprayerSchema>
  'calibration.create': z.input<typeof createCalibrationSchema>
  'calibration.withdraw': z.input<typeof withdrawCalibrationSchema>
  'certificate.add': z.input<typeof addCertificateSchema>
  'certificate.change': z.input<typeof changeCertificateSchema>
  'certificate.withdraw': z.input<typeof withdrawCertificateSchema>
  'farm.update': z.input<typeof updateFarmSchema>
  'start.update': z.input<typeof updateStartSchema>
  'practice.make': { id: string }
  'practice.away': Record<string, never>
  'invitation.create': z.input<typeof createInvitationSchema>
  'invitation.resend': z.input<typeof onInvitationSchema>
  'invitation.withdraw': z.input<typeof onInvitationSchema>
  'letter.resend': z.input<typeof resendLetterSchema>
  'person.add': z.input<typeof addPersonSchema>
  'person.change': z.input<typeof changePersonSchema>
  'person.pin': z.input<typeof setPinSchema>
  'person.endSessions': z.input<typeof proveOwnerSchema>
  'person.resetFactor': z.input<typeof proveOwnerSchema>
  'farm.askFactor': z.input<typeof askFactorSchema>
  'phone.enrol': z.input<typeof enrolPhoneSchema>
  'phone.revoke': Record<string, never>
  'paper.add': z.input<typeof addPaperSchema>
  'paper.change': z.input<typeof changePaperSchema>
  'record.create': z.input<typeof createRecordSchema>
  'record.update': z.input<typeof updateRecordSchema>
  'record.sign': z.input<typeof signRecordSchema>
  'filter.keep': z.input<typeof createSavedFilterSchema>
  'filter.forget': Record<string, never>
  'grant.give': z.input<typeof giveGrantSchema>
  'grant.change': z.input<typeof changeGrantSchema>
  'grant.end': z.input<typeof endGrantSchema>
  'record.signMany': z.input<typeof signManySchema>
  'record.amend': z.input<typeof amendRecordSchema>
  'record.withdraw': z.input<typeof withdrawRecordSchema>
  'record.review': z.input<typeof reviewRecordSchema>
  'record.discard': z.input<typeof discardRecordSchema>
  'plan.create': z.input<typeof createPlanSchema>
  'plan.update': z.input<typeof updatePlanSchema>
  'plan.end': z.input<typeof endPlanSchema>
  'plan.reopen': z.input<typeof reopenPlanSchema>
  'job.move': z.input<typeof moveJobSchema>
  'job.skip': z.input<typeof skipJobSchema>
  'job.unskip': z.input<typeof unskipJobSchema>
}

/** What the server answers to each. */
export interface CommandAnswers {
  'farm.create': Farm
  'block.create': Block
  'block.update': Block
  'block.split': BlocksChanged
  'block.merge': BlocksChanged
  'block.reopen': BlocksChanged
  'block.land': Block
  'planting.create': Planting
  'planting.update': Planting
  'bed.create': Bed
  'bed.update': Bed
  'event.create': FarmEvent
  'event.withdraw': FarmEvent
  'site.create': Site
  'site.change': Site
  'ground.create': GroundFeature
  'ground.change': GroundFeature
  'block.import': BlocksImported
  'material.create': Material
  'lot.create': Lot
  'lot.count': Lot
  'sprayer.create': Sprayer
  'sprayer.update': Sprayer
  'sprayer.retire': Sprayer
  'calibration.create': Calibration
  'calibration.withdraw': Calibration
  'certificate.add': Certificate
  'certificate.change': Certificate
  'certificate.withdraw': Certificate
  'farm.update': Farm
  'start.update': Start
  'practice.make': Farm
  'practice.away': undefined
  'invitation.create': Invitation
  'invitation.resend': Invitation
  'invitation.withdraw': Invitation
  'letter.resend': Letter
  'person.add': Person
  'person.change': Person
  'person.pin': Person
  'person.endSessions': undefined
  'person.resetFactor': undefined
  'farm.askFactor': { asked: boolean }
  'phone.enrol': SharedPhone
  'phone.revoke': undefined
  'paper.add': PersonPaper
  'paper.change': PersonPaper
  'record.create': ApplicationRecord
  'record.update': ApplicationRecord
  'record.sign': ApplicationRecord
  'filter.keep': SavedFilter
  'filter.forget': undefined
  'grant.give': Grant
  'grant.change': Grant
  'grant.end': Grant
  'record.signMany': SignManyAnswer
  'record.amend': ApplicationRecord
  'record.withdraw': ApplicationRecord
  'record.review': ApplicationRecord
  'record.discard': undefined
  'plan.create': SeasonPlan
  'plan.update': SeasonPlan
  'plan.end': SeasonPlan
  'plan.reopen': SeasonPlan
  'job.move': Job
  'job.skip': Job
  'job.unskip': Job
}

export type CommandKind = keyof CommandBodies

/** What a command is about, for whom finds it kept without the page it came from: its name, and the civil day it stood on. */
export interface CommandAbout { name: string; day: string }

/** Something to be written: `id` names the thing it is about (the lot of a count, the record of a signature, the farm of several). */
export type Command<Kind extends CommandKind = CommandKind> = {
  [K in Kind]: { kind: K; farmId: string; id: string; body: CommandBodies[K]; about?: CommandAbout }
}[Kind]
