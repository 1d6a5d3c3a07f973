import { readonly, ref, type Ref } from 'vue'

const KEY = 'first-hour-trail'
/** Whether this window came from a step of the first hour; a reload changes nothing about that. */
const isOn = ref(window.sessionStorage.getItem(KEY) !== null)

/** The way back to the first hour: begun by leaving it for a step's own page, over when it is open again. */
export function useFirstHourTrail(): { isOn: Readonly<Ref<boolean>>; begin: () => void; end: () => void } {
  return {
    isOn: readonly(isOn),
    begin: () => {
      window.sessionStorage.setItem(KEY, 'on')
      isOn.value = true
    },
    end: () => {
      window.sessionStorage.removeItem(KEY)
      isOn.value = false
    },
  }
}
