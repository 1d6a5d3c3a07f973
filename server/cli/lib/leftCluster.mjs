import { existsSync, readFileSync, rmSync } from 'node:fs'
import { join } from 'node:path'
import { endProcess, identityOf, isAlive, processesIn, waitUntil, workingFolderOf } from './processes.mjs'

/** Fast stop, then stop without a checkpoint, then none at all (signals of the postmaster: PostgreSQL manual, 19.5). */
export const stopSteps = /** @type {const} */ ([['SIGINT', 20_000], ['SIGQUIT', 5000], ['SIGKILL', 5000]])

/**
 * What an earlier run left of a cluster: stops it where it still runs, waits for the processes of a killed one, and takes
 * its pid file away once nothing works in the folder any more. Touches no process outside the folder.
 * @param {string} folder of the cluster, absolute, without links
 * @returns {Promise<boolean>} whether anything had to be stopped
 */
export async function stopLeftCluster(folder) {
  const pidFile = join(folder, 'postmaster.pid')
  if (!existsSync(pidFile)) return false
  const pid = Number(readFileSync(pidFile, 'utf8').split('\n')[0])
  const postmaster = identityOf(pid)
  const ours = isAlive(postmaster) && workingFolderOf(pid) === folder
  if (ours) await endProcess(postmaster, stopSteps)
  await waitUntil(() => processesIn(folder).length === 0, 5000)
  for (const left of processesIn(folder)) await endProcess(left, [['SIGKILL', 5000]])
  rmSync(pidFile, { force: true })
  return ours
}
