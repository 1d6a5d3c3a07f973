import { parseArgs } from 'node:util'
import { OneLine } from './OneLine.mjs'

/** Figures in the order in which they are measured. */
export const figureIds = /** @type {const} */ (['list', 'growth', 'write', 'sign', 'pdf', 'pdfmem', 'load', 'map'])

/**
 * What `npm run bench` is asked for.
 * @param {readonly string[]} args
 * @returns {{ json: string | undefined, only: readonly string[], quick: boolean }}
 * @throws {OneLine} where a figure or an option is none of ours
 */
export function parseBenchArguments(args) {
  const options = /** @type {const} */ ({ json: { type: 'string' }, only: { type: 'string' }, quick: { type: 'boolean', default: false } })
  const { values } = readOptions(() => parseArgs({ args: [...args], options }))
  const only = values.only === undefined ? figureIds : values.only.split(',')
  const unknown = only.find((id) => !figureIds.some((known) => known === id))
  if (unknown !== undefined) throw new OneLine(`There is no figure "${unknown}": --only takes ${figureIds.join(', ')}.`)
  return { json: values.json, only, quick: values.quick }
}

/** @template Read @param {() => Read} read @returns {Read} */
function readOptions(read) {
  try {
    return read()
  } catch (error) {
    throw new OneLine(`${error instanceof Error ? error.message : String(error)}\nUse: npm run bench -- [--json FILE] [--only ${figureIds.join(',')}] [--quick]`)
  }
}
