import { In, IsNull, type EntityManager } from 'typeorm'
import type { SignedRecord } from '../../../shared/contract/signedRecord.ts'
import { distanceKm } from '../../../shared/geo/distanceKm.ts'
import type { Language } from '../../../shared/messages/translate.ts'
import type { FarmActor } from '../../database/actor.ts'
import { ApplicationRecord } from '../../entities/ApplicationRecord.ts'
import { Block } from '../../entities/Block.ts'
import { Person } from '../../entities/Person.ts'
import { RecordReview } from '../../entities/RecordReview.ts'
import { RecordVersion } from '../../entities/RecordVersion.ts'
import { AppError, notFound } from '../../errors.ts'
import type { RecordReportData } from '../../reports/recordReportData.ts'
import { readCertificates } from '../farms/certificates.ts'
import { publicAddress } from '../publicAddress.ts'
import type { Services } from '../services.ts'
import { readSigned } from './readSigned.ts'
import { readSurroundings } from './readSurroundings.ts'

/** Blocks whose middle lies further away are not drawn as neighbours. */
const NEIGHBOUR_KM = 1

interface Asked {
  language: Language
  /** The newest where none is asked for. */
  version?: number | undefined
}

/** Everything the PDF of a record shows, from one of its signed versions. @throws {AppError} not-found, `record.not_signed`. */
export async function collectRecordReport(services: Services, actor: FarmActor, id: string, { language, version }: Asked): Promise<RecordReportData> {
  return services.database.inFarm(actor, async (manager) => {
    const record = await manager.findOneBy(ApplicationRecord, { farmId: actor.farmId, id })
    if (!record) throw notFound()
    if (record.state !== 'signed' && record.state !== 'withdrawn') throw new AppError('conflict', 'record.not_signed')
    const newest = await manager.findOneByOrFail(RecordVersion, { farmId: actor.farmId, recordId: id, version: record.version })
    const printed = version === undefined ? newest : await manager.findOneBy(RecordVersion, { farmId: actor.farmId, recordId: id, version })
    if (!printed) throw notFound()
    const signed = readSigned(printed)
    const checkPage = `${publicAddress(services.config)}/check`
    return {
      signed,
      digest: printed.digest,
      signedWith: printed.signedWith,
      ...(await namePeople(manager, signed)),
      newest: { version: newest.version, digest: newest.digest },
      neighbours: await findNeighbours(manager, signed),
      ...(await readSurroundings(manager, signed)),
      state: record.state,
      certificates: await readCertificates(manager, actor),
      printedAt: services.clock.now().toISOString(),
      checkUrl: `${checkPage}/${printed.checkCode}`,
      checkPage: checkPage.replace(/^https?:\/\//, ''),
      runBy: 'farm',
      language,
    }
  })
}

/** The names of those who stand in the version, and who reviewed it; a name that was blanked is empty. */
async function namePeople(manager: EntityManager, { farm, people, record }: SignedRecord): Promise<Pick<RecordReportData, 'names' | 'reviews'>> {
  const reviews = await manager.find(RecordReview, {
    where: { farmId: farm.id, recordId: record.id, version: record.version }, order: { at: 'ASC', id: 'ASC' },
  })
  const ids = [people.doneBy.id, people.enteredBy.id, people.signedBy.id, ...reviews.map(({ reviewedById }) => reviewedById)]
  const found = await manager.find(Person, { select: { id: true, name: true }, where: { farmId: farm.id, id: In(ids) } })
  const name = (id: string) => found.find((person) => person.id === id)?.name ?? ''
  return {
    names: { doneBy: name(people.doneBy.id), enteredBy: name(people.enteredBy.id), signedBy: name(people.signedBy.id) },
    reviews: reviews.map(({ reviewedById, at, note }) => ({ by: name(reviewedById), at: at.toISOString(), note })),
  }
}

async function findNeighbours(manager: EntityManager, { farm, blocks }: SignedRecord): Promise<RecordReportData['neighbours']> {
  const own = new Set(blocks.map(({ id }) => id))
  const others = await manager.find(Block, { select: { id: true, code: true, geometry: true, fromIds: true }, where: { farmId: farm.id, endedOn: IsNull() }, order: { code: 'ASC', id: 'ASC' } })
  return others
    .filter(({ id, geometry, fromIds }) => !own.has(id) && !fromIds.some((from) => own.has(from)) && blocks.some((block) => distanceKm(block.geometry, geometry) < NEIGHBOUR_KM))
    .map(({ code, geometry }) => ({ code, geometry }))
}
