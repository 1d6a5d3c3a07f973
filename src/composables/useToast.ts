import { ElMessage } from 'element-plus'

/** A short word at the edge of the screen about what has just been done. */
export function useToast(): {
  done: (words: string) => void
  /** Kept on this device, not sent. */
  kept: (words: string) => void
  failed: (words: string) => void
} {
  return {
    done: (words) => { ElMessage({ message: words, type: 'success', duration: 5000, grouping: true }) },
    kept: (words) => { ElMessage({ message: words, type: 'warning', duration: 7000, grouping: true }) },
    failed: (words) => { ElMessage({ message: words, type: 'error', duration: 9000, grouping: true, showClose: true }) },
  }
}
