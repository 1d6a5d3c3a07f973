/** A thing that is missing or in the way: its message is the one line to print before exit 1. */
export class OneLine extends Error {}

const fileProblems = {
  ENOSPC: 'the disk is full: free some space',
  EDQUOT: 'the disk quota is used up: free some space',
  EACCES: 'this user may not write there: give it the folder or choose another with DATA_DIR',
  EPERM: 'this user may not write there: give it the folder or choose another with DATA_DIR',
  EROFS: 'that disk is read-only: choose another folder with DATA_DIR',
}

/**
 * The one line for an error of the file system; undefined for any other error.
 * @param {unknown} error
 * @returns {string | undefined}
 */
export function fileProblem(error) {
  if (!(error instanceof Error) || !('code' in error)) return undefined
  const text = fileProblems[/** @type {keyof typeof fileProblems} */ (error.code)]
  if (text === undefined) return undefined
  return 'path' in error ? `${String(error.path)}: ${text}.` : `A file could not be written: ${text}.`
}
