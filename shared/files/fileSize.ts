const BYTES_PER_KB = 1_000
const BYTES_PER_MB = 1_000_000

/** The size of a file to be read: megabytes to a tenth, or whole kilobytes, at least 1. @source SI prefixes, IEC 80000-13. */
export function fileSize(bytes: number): { value: string; unit: 'MB' | 'kB' } {
  if (bytes >= BYTES_PER_MB - BYTES_PER_KB / 2) return { value: (bytes / BYTES_PER_MB).toFixed(1), unit: 'MB' }
  return { value: String(Math.max(1, Math.round(bytes / BYTES_PER_KB))), unit: 'kB' }
}
