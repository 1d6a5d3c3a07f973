/** Less than this is left to the engine, bytes. */
const MUCH = 64 * 1024 * 1024

/**
 * Collects what drawn documents left behind, where that is much: the engine by itself lets the heap grow to about twice its size first,
 * so that the fourth volume of a register would need far more room than the first. Nothing where the process was not started with `--expose-gc`.
 */
export function giveBack(): void {
  if (process.memoryUsage().heapUsed > MUCH) globalThis.gc?.()
}
