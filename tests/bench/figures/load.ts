import { gzipSync } from 'node:zlib'
import vue from '@vitejs/plugin-vue'
import { build, type Rolldown } from 'vite'
import { FIELD_PATH } from '../../../vite/pieces.ts'

/** The field path with the words of one language: English and Spanish weigh the same within a few hundred bytes. */
const WEIGHED = [...FIELD_PATH, 'shared/messages/es/first.ts']

/** Kilobytes of script, packed as the server packs them, of ours and of the least page of the same libraries. Exact: nothing is timed. */
export async function measureLoad(): Promise<{ ours: number; baseline: number }> {
  const ours = await buildChunks({ build: { write: false } })
  const bare = await buildChunks({ root: 'tests/bench/baselines/bareApp', configFile: false, plugins: [vue()], build: { write: false } })
  return { ours: weigh(ours, WEIGHED) / 1000, baseline: weigh(bare, []) / 1000 }
}

async function buildChunks(config: Parameters<typeof build>[0]): Promise<Rolldown.OutputChunk[]> {
  const built = await build({ logLevel: 'error', ...config })
  if (!('output' in built)) throw new Error('the build answers something else than files')
  return built.output.filter((file) => file.type === 'chunk')
}

/** Weight of the page's own script and of what the path asks for, each with all it imports, each once. */
function weigh(chunks: readonly Rolldown.OutputChunk[], path: readonly string[]): number {
  const byName = new Map(chunks.map((chunk) => [chunk.fileName, chunk]))
  const wanted = path.map((part) => {
    const found = chunks.find(({ facadeModuleId }) => facadeModuleId?.endsWith(`/${part}`))
    if (found === undefined) throw new Error(`no chunk of its own: ${part}`)
    return found
  })
  const needed = new Set<Rolldown.OutputChunk>()
  const take = (chunk: Rolldown.OutputChunk | undefined): void => {
    if (chunk === undefined || needed.has(chunk)) return
    needed.add(chunk)
    for (const name of chunk.imports) take(byName.get(name))
  }
  for (const chunk of [...chunks.filter(({ isEntry }) => isEntry), ...wanted]) take(chunk)
  return [...needed].reduce((sum, { code }) => sum + gzipSync(code).length, 0)
}
