import type { Rolldown } from 'vite'

type Ask = Pick<Rolldown.ChunkingContext, 'getModuleInfo'>

/** What a phone reads from sign-in over Today to a new record: what it always reads, and three views. The bench `load` weighs it. */
export const FIELD_PATH = ['src/start.ts', 'src/views/sign-in/SignInView.vue', 'src/views/today/TodayView.vue', 'src/views/register/RecordFormView.vue']
const FIELD_FILES = ['src/main.ts', ...FIELD_PATH].map((path) => new URL(`../${path}`, import.meta.url).pathname)
/** Of a language only its own words are read. */
const WORDS = /[\\/]messages[\\/](en|es)[\\/]/
const LIBRARIES = /node_modules[\\/](@vue|vue|vue-router|pinia|@tanstack|vue-i18n|@intlify|zod|decimal\.js|temporal-polyfill|temporal-utils|idb|uuid)[\\/]/
/** A smaller piece, in bytes of source, is not worth a request of its own: it goes into the one that is read with it most. */
const SMALLEST = 20_000

/** All that the field path imports, itself or over others. */
function findField(ask: Ask): ReadonlySet<string> {
  const found = new Set<string>()
  const take = (id: string): void => {
    if (found.has(id)) return
    found.add(id)
    for (const imported of ask.getModuleInfo(id)?.importedIds ?? []) take(imported)
  }
  for (const id of FIELD_FILES) take(id)
  return found
}

/**
 * How the client is cut into pieces. A piece packs the better the more of a kind is in it, and each is a request of its own; but what
 * the field path does not need must not lie in a piece that it reads. What two views share goes with those that share it.
 */
export function cutPieces(): Rolldown.CodeSplittingGroup[] {
  let field: ReadonlySet<string> | null = null
  const isField = (id: string, ask: Ask): boolean => (field ??= findField(ask)).has(id)
  const isView = (id: string): boolean => FIELD_FILES.includes(id)
  const byViews = { entriesAware: true, entriesAwareMergeThreshold: SMALLEST }
  return [
    // What the page's own script needs before all else: it says how the policy stands before any schema is made.
    { name: 'helper', test: /preload-helper/, priority: 1 },
    { name: 'libraries', test: LIBRARIES },
    { name: 'common', test: /[\\/](src|shared)[\\/]/, minShareCount: 10 },
    { name: (id, ask) => (isField(id, ask) && !isView(id) && !WORDS.test(id) ? 'field' : null), ...byViews },
    { name: (id, ask) => (isField(id, ask) || WORDS.test(id) ? null : 'part'), minShareCount: 2, ...byViews },
  ]
}
