import { NetworkError } from '../../api/errors.ts'
import { keepRead, keptRead } from '../../stores/reads.ts'

/** Counts the shapes of what is kept: an answer of an older build, which lacks fields, is not read. */
const SHAPE = 'v6'

/**
 * Reads from the server and keeps the answer; without signal, gives the last answer kept on this device.
 * @throws {NetworkError} when there is no signal and nothing was kept; whatever else `read` throws.
 */
export async function readThrough<Answer>(key: string, accountId: string, read: () => Promise<Answer>): Promise<Answer> {
  try {
    const answer = await read()
    await keepRead(`${SHAPE}/${key}`, accountId, answer)
    return answer
  } catch (error) {
    if (!(error instanceof NetworkError)) throw error
    const kept = await keptRead(`${SHAPE}/${key}`, accountId)
    if (kept === undefined) throw error
    return kept as Answer
  }
}
