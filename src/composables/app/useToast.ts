import type { MessageParams } from 'element-plus'
import { h } from 'vue'
import { laterCode } from './laterPart.ts'

const readMessage = laterCode(() => import('element-plus/es/components/message/index'))

const show = (params: MessageParams) => readMessage().then(({ ElMessage }) => ElMessage(params))

/** A short word at the edge of the screen about what has just been done. */
export function useToast(): {
  done: (words: string) => void
  /** Done, with a button beside it that takes it back or leads on. */
  withWay: (words: string, way: string, act: () => void) => void
  /** Kept on this device, not sent. */
  kept: (words: string) => void
  failed: (words: string) => void
} {
  return {
    done: (words) => { void show({ message: words, type: 'success', duration: 5000, grouping: true }) },
    withWay: (words, way, act) => {
      const press = (): void => {
        void shown.then(({ close }) => { close() })
        act()
      }
      const shown = show({
        message: h('span', { class: 'toast-way' }, [words, ' ', h('button', { type: 'button', class: 'lnk', onClick: press }, way)]),
        type: 'success', duration: 20_000, showClose: true,
      })
    },
    kept: (words) => { void show({ message: words, type: 'warning', duration: 7000, grouping: true }) },
    failed: (words) => { void show({ message: words, type: 'error', duration: 9000, grouping: true, showClose: true }) },
  }
}
