const everyMs = 250

/**
 * Calls back once when the process that started this one is gone: a killed parent cannot pass on a signal.
 * The watch keeps nothing alive.
 * @param {() => void} callback
 */
export function onParentGone(callback) {
  const parent = process.ppid
  const timer = setInterval(() => {
    if (process.ppid === parent) return
    clearInterval(timer)
    callback()
  }, everyMs)
  timer.unref()
}
