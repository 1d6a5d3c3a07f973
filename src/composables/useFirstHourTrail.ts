import { readonly, ref, type Ref } from 'vue'

/** Whether the page that is open was come to from a step of the first hour; as long as the app stays open. */
const isOn = ref(false)

/** The way back to the first hour: begun by leaving it for a step's own page, over when it is open again. */
export function useFirstHourTrail(): { isOn: Readonly<Ref<boolean>>; begin: () => void; end: () => void } {
  return { isOn: readonly(isOn), begin: () => { isOn.value = true }, end: () => { isOn.value = false } }
}
