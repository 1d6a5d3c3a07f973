/**
 * @typedef {(topic: string, text: string) => void} Say one line of progress
 */

/** Progress for people, on stdout. @type {Say} */
export function say(topic, text) {
  process.stdout.write(`${topic}: ${text}\n`)
}

/** Progress for commands whose stdout is data. @type {Say} */
export function sayAside(topic, text) {
  process.stderr.write(`${topic}: ${text}\n`)
}

/**
 * Seconds since a moment of performance.now(), as people read it.
 * @param {number} startedAt
 */
export function secondsSince(startedAt) {
  return `${((performance.now() - startedAt) / 1000).toFixed(1)} s`
}
