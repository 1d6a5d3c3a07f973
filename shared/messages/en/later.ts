import { blocks } from './blocks.ts'
import { check } from './check.ts'
import { due } from './due.ts'
import { farm } from './farm.ts'
import { files } from './files.ts'
import { grants } from './grants.ts'
import { ground } from './ground.ts'
import { growing } from './growing.ts'
import { importing } from './importing.ts'
import { journal } from './journal.ts'
import { letters } from './letters.ts'
import { likely } from './likely.ts'
import { merge } from './merge.ts'
import { people } from './people.ts'
import { problems } from './problems.ts'
import { profile } from './profile.ts'
import { rounds } from './rounds.ts'
import { shapes } from './shapes.ts'
import { sprayers } from './sprayers.ts'
import { start } from './start.ts'
import { versions } from './versions.ts'

/** What the other screens say; read when the first page stands. */
export const later = {
  blocks, check, due, farm, files, grants, ground, growing, importing, journal, letters, likely, merge, people, problems, profile, rounds, shapes, sprayers, start, versions,
}
