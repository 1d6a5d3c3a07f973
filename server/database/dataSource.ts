import 'reflect-metadata'
import pg from 'pg'
import { DataSource } from 'typeorm'
import { CreateHouse1764547200000 } from '../../migrations/1764547200000-CreateHouse.ts'
import { WholeRecords1764600000000 } from '../../migrations/1764600000000-WholeRecords.ts'
import { AddAttachments1764601000000 } from '../../migrations/1764601000000-AddAttachments.ts'
import { FindInRegister1764602000000 } from '../../migrations/1764602000000-FindInRegister.ts'
import { NarrowAccess1764603000000 } from '../../migrations/1764603000000-NarrowAccess.ts'
import { SayWhatReplaced1764630000000 } from '../../migrations/1764630000000-SayWhatReplaced.ts'
import { FindBySubject1764604000000 } from '../../migrations/1764604000000-FindBySubject.ts'
import { WholeBlocks1764610000000 } from '../../migrations/1764610000000-WholeBlocks.ts'
import { AddGround1764620000000 } from '../../migrations/1764620000000-AddGround.ts'
import { WholeFarm1764642000000 } from '../../migrations/1764642000000-WholeFarm.ts'
import { WholeGrants1764643000000 } from '../../migrations/1764643000000-WholeGrants.ts'
import { AddInvitations1764640001000 } from '../../migrations/1764640001000-AddInvitations.ts'
import { AddMail1764640000000 } from '../../migrations/1764640000000-AddMail.ts'
import { AddRounds1764644000000 } from '../../migrations/1764644000000-AddRounds.ts'
import { WholePeople1764641000000 } from '../../migrations/1764641000000-WholePeople.ts'
import { FindUnreviewed1764646000000 } from '../../migrations/1764646000000-FindUnreviewed.ts'
import { PruneLetters1764647000000 } from '../../migrations/1764647000000-PruneLetters.ts'
import { FindHolds1764651000000 } from '../../migrations/1764651000000-FindHolds.ts'
import { FindSeasonCode1764648000000 } from '../../migrations/1764648000000-FindSeasonCode.ts'
import { KeepCertificates1764652000000 } from '../../migrations/1764652000000-KeepCertificates.ts'
import { RememberGrants1764652001000 } from '../../migrations/1764652001000-RememberGrants.ts'
import { CountOnLand1764653000000 } from '../../migrations/1764653000000-CountOnLand.ts'
import { ENTITIES } from './entities.ts'

const DATE_TYPE = 1082
/** Civil dates stay 'YYYY-MM-DD': a driver's local midnight would be another day elsewhere. */
pg.types.setTypeParser(DATE_TYPE, (text) => text)

const common = {
  type: 'postgres',
  entities: ENTITIES,
  installExtensions: false,
  uuidExtension: 'pgcrypto',
  logging: false,
} as const

/**
 * The app role's data source. Import it in server/database only; everything else goes through `inFarm` or `inHouse`.
 * Statements that do not wait for each other's answers are sent together (`pipeline`): see `together`.
 * @param onFault hears of idle connections that broke; the pool replaces them.
 */
export function createAppSource(url: string, poolSize: number, onFault: (error: unknown) => void): DataSource {
  return new DataSource({ ...common, url, poolSize, poolErrorHandler: onFault, extra: { application_name: 'drenchleaf', pipeline: true } })
}

/** The owner role's data source, for migrations and rights; one connection, closed after use. */
export function createOwnerSource(url: string): DataSource {
  return new DataSource({
    ...common,
    url,
    poolSize: 1,
    migrations: [
      CreateHouse1764547200000,
      WholeRecords1764600000000,
      AddAttachments1764601000000,
      FindInRegister1764602000000,
      NarrowAccess1764603000000,
      FindBySubject1764604000000,
      WholeBlocks1764610000000,
      AddGround1764620000000,
      SayWhatReplaced1764630000000,
      AddMail1764640000000,
      AddInvitations1764640001000,
      WholePeople1764641000000,
      WholeFarm1764642000000,
      WholeGrants1764643000000,
      AddRounds1764644000000,
      FindUnreviewed1764646000000,
      PruneLetters1764647000000,
      FindSeasonCode1764648000000,
      FindHolds1764651000000,
      KeepCertificates1764652000000,
      RememberGrants1764652001000,
      CountOnLand1764653000000,
    ],
    migrationsTransactionMode: 'each',
  })
}
