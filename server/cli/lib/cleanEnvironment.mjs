/**
 * An environment in which nothing of this shell reaches a database or its tools (PGHOST, PGOPTIONS, LANG …).
 * @param {NodeJS.ProcessEnv} [env]
 * @returns {NodeJS.ProcessEnv}
 */
export function cleanEnvironment(env = process.env) {
  const kept = Object.entries(env).filter(([name]) => !/^(PG|LC_|LANG)/.test(name))
  return { ...Object.fromEntries(kept), LANG: 'C.UTF-8', LC_ALL: 'C.UTF-8', TZ: 'UTC' }
}
