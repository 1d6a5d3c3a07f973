import { onScopeDispose, ref, type Ref } from 'vue'

/** Which layout this window has: phone under 720 px, tablet to 1279, desk from 1280; `isWide` from 1024. */
export interface DeviceShape {
  isPhone: Ref<boolean>
  isTablet: Ref<boolean>
  isDesk: Ref<boolean>
  isWide: Ref<boolean>
  /** Fingers rather than a pointer. */
  isTouch: Ref<boolean>
}

/** The shape of this window, kept up to date while the component lives. */
export function useDevice(): DeviceShape {
  return {
    isPhone: media('(max-width: 719.98px)'),
    isTablet: media('(min-width: 720px) and (max-width: 1279.98px)'),
    isDesk: media('(min-width: 1280px)'),
    isWide: media('(min-width: 1024px)'),
    isTouch: media('(pointer: coarse)'),
  }
}

function media(query: string): Ref<boolean> {
  const list = window.matchMedia(query)
  const matches = ref(list.matches)
  const update = (): void => { matches.value = list.matches }
  list.addEventListener('change', update)
  onScopeDispose(() => { list.removeEventListener('change', update) })
  return matches
}
