import type { Problem } from '../../shared/contract/problem.ts'

/** The server read the request and refused it; `problem` says what and where. */
export class ApiError extends Error {
  readonly problem: Problem
  /** Seconds to wait before another try, where the server said so. */
  readonly retryAfterS: number | null

  constructor(problem: Problem, retryAfterS: number | null = null) {
    super(problem.detail)
    this.name = 'ApiError'
    this.problem = problem
    this.retryAfterS = retryAfterS
  }
}

/** No answer came: no signal, no server, or an answer that is not one of ours. */
export class NetworkError extends Error {
  constructor(cause?: unknown) {
    super('No answer', { cause })
    this.name = 'NetworkError'
  }
}
