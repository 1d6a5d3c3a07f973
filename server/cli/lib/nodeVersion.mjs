/**
 * What is wrong with this Node.js, in one line; undefined where it will do.
 * The numbers are those of "engines" in package.json. Written so that old versions can still read it.
 * @param {string} version as in process.versions.node
 * @returns {string | undefined}
 */
export function nodeVersionProblem(version) {
  const parts = version.split('.').map(Number)
  const major = parts[0] || 0
  const minor = parts[1] || 0
  const fits = (major === 20 && minor >= 19) || (major === 22 && minor >= 12) || major > 22
  if (fits) return undefined
  return 'Node.js ' + version + ' is too old: install Node.js 20.19 or a later 20, or 22.12 and later.'
}

/** Ends the process with that one line where Node.js does not fit. */
export function assertNodeVersion() {
  const problem = nodeVersionProblem(process.versions.node)
  if (problem === undefined) return
  console.error(problem)
  process.exit(1)
}
