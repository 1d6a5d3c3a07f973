import { onBeforeUnmount, onMounted, ref, type Ref, type ShallowRef } from 'vue'

/** Whether the head of a table stands stuck under the page head: its sentinel, just above it, has scrolled away. */
export function useStuckHead(sentinel: Readonly<ShallowRef<HTMLElement | null>>): Ref<boolean> {
  const isStuck = ref(false)
  let observer: IntersectionObserver | null = null
  onMounted(() => {
    if (sentinel.value === null || typeof IntersectionObserver === 'undefined') return
    observer = new IntersectionObserver(([entry]) => {
      if (entry === undefined) return
      isStuck.value = !entry.isIntersecting && entry.boundingClientRect.top < (entry.rootBounds?.top ?? 0) + 64
    }, { rootMargin: '-48px 0px 0px 0px' })
    observer.observe(sentinel.value)
  })
  onBeforeUnmount(() => observer?.disconnect())
  return isStuck
}
