import { readFileSync } from 'node:fs'
import type { Plugin } from 'vite'

/** Parts of libraries that nothing of the client reaches and no bundler can prove unreached: by their path, what stands in. */
const STANDS_IN: readonly { path: RegExp; code: (source: string) => string }[] = [
  // Buttons mix shades of a colour of their own; ours take theirs from the tokens.
  { path: /\/node_modules\/@ctrl\/tinycolor\/dist\/module\/public_api\.js$/, code: () => 'export class TinyColor { constructor() { refuse() } }' },
  // Only the server describes its schemas; each schema makes itself the means to, as it is made.
  {
    path: /\/node_modules\/zod\/v4\/core\/(json-schema-processors|to-json-schema)\.js$/,
    code: (source) => [...source.matchAll(/^export (?:const|function) (\w+)/gm)]
      .map(([, name]) => `export const ${name} = ${name?.startsWith('create') === true ? '() => refuse' : 'refuse'};`).join('\n'),
  },
  // Every schema says what is wrong by a code of ours, or by its kind.
  { path: /\/node_modules\/zod\/v4\/locales\/en\.js$/, code: () => 'export default () => ({ localeError: () => "" })' },
  // What the controls say before they are told a language; ours are told before they are shown. Its other readers ask for it by name.
  { path: /\/element-plus\/es\/locale\/lang\/en\.mjs\?spare$/, code: () => 'export default {}' },
  // A bridge to older versions of Vue that holds on to all of this one.
  { path: /\/node_modules\/vue-demi\/lib\/index\.mjs$/, code: () => 'export * from "vue"; export const isVue2 = false;' },
]
const REFUSE = 'const refuse = () => { throw new Error("left out of the client by vite/leaveOut.ts") };\n'

/** Leaves them out of what is built; whoever reaches one after all is told. */
export function leaveOut(): Plugin {
  return {
    name: 'leave-out',
    enforce: 'pre',
    apply: 'build',
    async resolveId(source, importer, options) {
      if (!source.endsWith('/locale/lang/en.mjs') || importer?.endsWith('/use-locale/index.mjs') !== true) return null
      const found = await this.resolve(source, importer, options)
      return found === null ? null : `${found.id}?spare`
    },
    load(id) {
      const found = STANDS_IN.find(({ path }) => path.test(id))
      return found === undefined ? null : REFUSE + found.code(readFileSync(id.split('?')[0] ?? id, 'utf8'))
    },
  }
}
