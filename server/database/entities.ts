import { Account } from '../entities/Account.ts'
import { AccountToken } from '../entities/AccountToken.ts'
import { ApplicationRecord } from '../entities/ApplicationRecord.ts'
import { Attachment } from '../entities/Attachment.ts'
import { Bed } from '../entities/Bed.ts'
import { Block } from '../entities/Block.ts'
import { BlockBoundary } from '../entities/BlockBoundary.ts'
import { Calibration } from '../entities/Calibration.ts'
import { Certificate } from '../entities/Certificate.ts'
import { Farm } from '../entities/Farm.ts'
import { FarmEvent } from '../entities/FarmEvent.ts'
import { FarmEventBlock } from '../entities/FarmEventBlock.ts'
import { FarmHead } from '../entities/FarmHead.ts'
import { Grant } from '../entities/Grant.ts'
import { GroundFeature } from '../entities/GroundFeature.ts'
import { JobDigest } from '../entities/JobDigest.ts'
import { Invitation } from '../entities/Invitation.ts'
import { JournalEntry } from '../entities/JournalEntry.ts'
import { Letter } from '../entities/Letter.ts'
import { Lot } from '../entities/Lot.ts'
import { LotEntry } from '../entities/LotEntry.ts'
import { Material } from '../entities/Material.ts'
import { Person } from '../entities/Person.ts'
import { PlanJob } from '../entities/PlanJob.ts'
import { PlanJobRecord } from '../entities/PlanJobRecord.ts'
import { PlanStep } from '../entities/PlanStep.ts'
import { PersonPaper } from '../entities/PersonPaper.ts'
import { Planting } from '../entities/Planting.ts'
import { RecordComponent } from '../entities/RecordComponent.ts'
import { RecordLine } from '../entities/RecordLine.ts'
import { RecordReview } from '../entities/RecordReview.ts'
import { RecordTerm } from '../entities/RecordTerm.ts'
import { RecordVersion } from '../entities/RecordVersion.ts'
import { RecoveryCode } from '../entities/RecoveryCode.ts'
import { RegisterEntry } from '../entities/RegisterEntry.ts'
import { ResetAsk } from '../entities/ResetAsk.ts'
import { SavedFilter } from '../entities/SavedFilter.ts'
import { SeasonCounter } from '../entities/SeasonCounter.ts'
import { SeasonHead } from '../entities/SeasonHead.ts'
import { SeasonPlan } from '../entities/SeasonPlan.ts'
import { SharedPhone } from '../entities/SharedPhone.ts'
import { Site } from '../entities/Site.ts'
import { Sprayer } from '../entities/Sprayer.ts'

/** Every entity of the house. */
export const ENTITIES = [
  Account,
  AccountToken,
  ApplicationRecord,
  Attachment,
  Bed,
  Block,
  BlockBoundary,
  Calibration, Certificate,
  Farm,
  FarmEvent,
  FarmEventBlock,
  FarmHead,
  Grant,
  GroundFeature,
  JobDigest,
  Invitation,
  JournalEntry,
  Letter,
  Lot,
  LotEntry,
  Material,
  Person,
  PlanJob,
  PlanJobRecord,
  PlanStep,
  PersonPaper,
  Planting,
  RecordComponent,
  RecordLine,
  RecordReview,
  RecordTerm,
  RecordVersion,
  RecoveryCode,
  RegisterEntry,
  ResetAsk,
  SavedFilter,
  SeasonCounter,
  SeasonHead,
  SeasonPlan,
  SharedPhone,
  Site,
  Sprayer,
]
