/**
 * @typedef {{
 *   readonly stopping: boolean,
 *   assertGoing: () => void,
 *   add: (stop: () => Promise<void> | void) => () => void,
 *   stop: () => Promise<void>,
 * }} Lifecycle
 */

/**
 * What was started and must be stopped again, last one first.
 * `assertGoing` stands before every start of a process and throws once all is being stopped, so that nothing is started
 * behind its back; `add` follows it without a pause and gives back a function that forgets the entry (the thing ended by
 * itself). `stop` may be called many times and runs once.
 * @returns {Lifecycle}
 */
export function createLifecycle() {
  /** @type {Set<() => Promise<void> | void>} */
  const stops = new Set()
  /** @type {Promise<void> | undefined} */
  let stopped
  const stopAll = async () => {
    for (const stop of [...stops].reverse()) await stop()
    stops.clear()
  }
  return {
    get stopping() {
      return stopped !== undefined
    },
    assertGoing() {
      if (stopped !== undefined) throw new Error('nothing is started any more: all is being stopped')
    },
    add(stop) {
      stops.add(stop)
      return () => void stops.delete(stop)
    },
    stop: () => (stopped ??= stopAll()),
  }
}
