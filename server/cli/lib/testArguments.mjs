import { OneLine } from './OneLine.mjs'

/** @typedef {'static' | 'unit' | 'api' | 'e2e'} TestKind */

/** All kinds, in the order in which they are reported. @type {readonly TestKind[]} */
export const testKinds = ['static', 'unit', 'api', 'e2e']

/**
 * What `npm test` is asked for: `--only kind[,kind]`, and anything else for the runners (files, names).
 * Without `--only`, files say by their folder which kind is meant.
 * @param {readonly string[]} args
 * @returns {{ kinds: readonly TestKind[], rest: readonly string[] }}
 * @throws {OneLine} where a kind is not one of ours
 */
export function parseTestArguments(args) {
  /** @type {string[]} */
  const only = []
  /** @type {string[]} */
  const rest = []
  for (let index = 0; index < args.length; index++) {
    const argument = args[index] ?? ''
    if (argument === '--only') only.push(...(args[++index] ?? '').split(','))
    else if (argument.startsWith('--only=')) only.push(...argument.slice('--only='.length).split(','))
    else rest.push(argument)
  }
  const unknown = only.find((kind) => !testKinds.some((known) => known === kind))
  if (unknown !== undefined) throw new OneLine(`There are no tests of the kind "${unknown}": --only takes ${testKinds.join(', ')}.`)
  const wanted = only.length > 0 ? only : kindsOfFiles(rest)
  return { kinds: testKinds.filter((kind) => wanted.includes(kind)), rest }
}

/** @param {readonly string[]} rest @returns {readonly string[]} */
function kindsOfFiles(rest) {
  const kinds = rest.filter((argument) => argument.includes('tests/')).map((file) => /tests\/(api|e2e)\b/.exec(file)?.[1] ?? 'unit')
  return kinds.length > 0 ? kinds : testKinds
}
