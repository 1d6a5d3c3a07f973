import { once } from 'node:events'
import { createInterface } from 'node:readline'
import { answerLine, describeFunctions } from './answerLine.ts'

/** One JSON a line on stdin, one JSON a line on stdout, in order; see contracts for the functions. */
async function main(): Promise<void> {
  // Whoever reads may close early (head): there is nobody left to tell.
  process.stdout.on('error', () => process.exit(0))
  if (process.argv.includes('--help')) {
    process.stdout.write(describeFunctions())
    return
  }
  for await (const line of createInterface({ input: process.stdin, crlfDelay: Infinity })) {
    if (!process.stdout.write(`${answerLine(line)}\n`)) await once(process.stdout, 'drain')
  }
}

await main()
