import { ref, toValue, watchEffect, type MaybeRefOrGetter, type Ref } from 'vue'

/** False until the source has once been true. */
export function useOnce(source: MaybeRefOrGetter<boolean>): Readonly<Ref<boolean>> {
  const was = ref(false)
  watchEffect(() => { was.value ||= toValue(source) })
  return was
}
