import { OneLine } from './OneLine.mjs'
import { takeInstanceLock } from './instanceLock.mjs'

/**
 * Takes a data folder for this command alone, until the lifecycle ends.
 * @param {{ folder: string, lifecycle: import('./lifecycle.mjs').Lifecycle }} wish
 * @returns {Promise<{ nowRunsAt: (url: string) => void }>} nowRunsAt: what others are told from then on
 * @throws {OneLine} where another command has it
 */
export async function holdDataPlace({ folder, lifecycle }) {
  /** @type {string | undefined} */
  let runsAt
  const describe = () => {
    if (lifecycle.stopping) return /** @type {const} */ ({ phase: 'stopping' })
    return runsAt === undefined ? /** @type {const} */ ({ phase: 'starting' }) : /** @type {const} */ ({ phase: 'running', url: runsAt })
  }
  const place = await takeInstanceLock(`data ${folder}`, describe)
  if ('lock' in place) {
    lifecycle.add(place.lock.release)
    return { nowRunsAt: (url) => void (runsAt = url) }
  }
  const { holder } = place
  if (holder?.phase === 'running') throw new OneLine(`Drenchleaf already runs at ${holder.url} (process ${holder.pid}).`)
  throw new OneLine(`Another command already uses the data in ${folder}${holder === undefined ? '' : ` (process ${holder.pid}, ${holder.phase})`}.`)
}
