import { ApiError } from '../../api/errors.ts'

/** Whether a read failed because there is nothing of ours under that number. */
export function isNotFound(error: unknown): boolean {
  return error instanceof ApiError && error.problem.status === 404
}
