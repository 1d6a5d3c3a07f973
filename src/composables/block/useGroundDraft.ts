import { computed, watch } from 'vue'
import { useSession } from '../../stores/session.ts'
import type { GroundForm, GroundSubject, GroundWords } from './useGroundForm.ts'
import { useKeptForm, type KeptForm } from '../form/useKeptForm.ts'
import type { KeptDrawing, PlaceDrawing } from './usePlaceDrawing.ts'

/** A site or a piece of the ground plan in the making: what the device keeps. */
export interface GroundContent { words: GroundWords; drawing: KeptDrawing }

/** Keeps form and drawing through a reload. */
export function useGroundDraft({ what, was }: GroundSubject, form: GroundForm, drawing: PlaceDrawing): KeptForm<GroundContent> {
  const session = useSession()
  const now = computed<GroundContent>(() => ({ words: { ...form.draft }, drawing: drawing.kept.value }))
  const fresh = now.value
  const kept = useKeptForm<GroundContent>(fresh, {
    farmId: computed(() => session.farmId), kind: 'place', about: () => `${what}:${was?.id ?? session.farmId}`, fresh: () => fresh,
    // A new one has another id each time.
    isBegun: ({ words, drawing: drawn }) => JSON.stringify([{ ...words, id: '' }, drawn]) !== JSON.stringify([{ ...fresh.words, id: '' }, fresh.drawing]),
  })
  watch(kept.content, ({ words, drawing: drawn }) => {
    Object.assign(form.draft, words)
    drawing.resume(drawn)
  })
  watch(now, (content) => {
    if (kept.ready.value && JSON.stringify(content) !== JSON.stringify(kept.content.value)) kept.content.value = content
  })
  return kept
}
