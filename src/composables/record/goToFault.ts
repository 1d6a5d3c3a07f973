import { nextTick } from 'vue'

/** Puts the reader and the keyboard on the first field of the page that is marked as wrong; nothing moves where none is. */
export async function goToFault(): Promise<void> {
  await nextTick()
  const field = document.querySelector<HTMLElement>('#page [aria-invalid="true"]')
  field?.scrollIntoView({ block: 'center' })
  field?.focus({ preventScroll: true })
}
