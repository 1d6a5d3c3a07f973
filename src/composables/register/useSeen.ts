import { onBeforeUnmount, onMounted, type ShallowRef } from 'vue'

/** Calls back whenever the element comes near the reader's eyes; where the browser cannot say, the button beside it does. */
export function useSeen(target: Readonly<ShallowRef<HTMLElement | null>>, onSeen: () => void): void {
  let observer: IntersectionObserver | null = null
  onMounted(() => {
    if (target.value === null || typeof IntersectionObserver === 'undefined') return
    observer = new IntersectionObserver((entries) => {
      if (entries.some(({ isIntersecting }) => isIntersecting)) onSeen()
    }, { rootMargin: '240px' })
    observer.observe(target.value)
  })
  onBeforeUnmount(() => observer?.disconnect())
}
