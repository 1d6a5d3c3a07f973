import { blocks } from './blocks.ts'
import { check } from './check.ts'
import { draftElsewhere } from './draftElsewhere.ts'
import { due } from './due.ts'
import { farm } from './farm.ts'
import { files } from './files.ts'
import { grants } from './grants.ts'
import { ground } from './ground.ts'
import { growing } from './growing.ts'
import { happened } from './happened.ts'
import { importing } from './importing.ts'
import { journal } from './journal.ts'
import { letters } from './letters.ts'
import { likely } from './likely.ts'
import { merge } from './merge.ts'
import { people } from './people.ts'
import { problems } from './problems.ts'
import { profile } from './profile.ts'
import { recordRead } from './recordRead.ts'
import { rounds } from './rounds.ts'
import { shapes } from './shapes.ts'
import { sprayers } from './sprayers.ts'
import { start } from './start.ts'
import { versions } from './versions.ts'

/** What the other screens say; read when the first page stands. */
export const later = {
  blocks, check, draftElsewhere, due, farm, files, grants, ground, growing, happened, importing, journal, letters, likely, merge, people, problems, profile, recordRead, rounds, shapes, sprayers, start, versions,
}
