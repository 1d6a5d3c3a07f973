import { ref, watch, type Ref } from 'vue'
import type { Check } from '../../../shared/contract/record.ts'
import { renderMessage } from '../../../shared/messages/renderMessage.ts'
import { useShownCheck } from '../../composables/record/useShownCheck.ts'
import { translate, type Language } from '../../../shared/messages/translate.ts'

const QUIET_MS = 1000

/** What has changed among live checks since the last time, in one short line; said at most once a second. */
export function useSpokenChanges(checks: () => readonly Check[], language: () => Language): Ref<string> {
  const spoken = ref('')
  const shown = useShownCheck()
  const said = (): [string, string][] => lines(checks().map(shown), language())
  let before = new Map(said())
  let timer: number | undefined

  watch(said, (after, _old, onCleanup) => {
    window.clearTimeout(timer)
    timer = window.setTimeout(() => {
      spoken.value = after.filter(([key, line]) => before.get(key) !== line).map(([, line]) => line).join('. ')
      before = new Map(after)
    }, QUIET_MS)
    onCleanup(() => { window.clearTimeout(timer) })
  })
  return spoken
}

function lines(checks: readonly Check[], language: Language): [string, string][] {
  return checks.map((check) => {
    const figure = check.figure === null ? '' : `, ${renderMessage(language, check.figure)}`
    const rests = translate(language, `frame.rests.${check.rests}`).toLowerCase()
    const word = translate(language, `frame.verdict.${check.verdict}`)
    return [`${check.code}/${check.about ?? ''}`, `${word}, ${rests}: ${renderMessage(language, check.title)}${figure}`]
  })
}
