/**
 * Runs work that is asked for again and again never beside itself; being asked while it runs makes it run once more.
 * @param failed hears what it threw.
 */
export function oneAtATime(work: () => Promise<unknown>, failed: (error: unknown) => void): { again(): void; idle(): Promise<void> } {
  let running: Promise<void> | null = null
  let isAsked = false
  const run = async (): Promise<void> => {
    while (isAsked) {
      isAsked = false
      await work().catch(failed)
    }
    running = null
  }
  return {
    again: () => {
      isAsked = true
      running ??= run()
    },
    idle: () => running ?? Promise.resolve(),
  }
}
