import { toValue, watchEffect, type MaybeRefOrGetter } from 'vue'
import { useI18n } from 'vue-i18n'

/** Names the page in the browser's tab and history: what is open, then the product. */
export function usePageTitle(title: MaybeRefOrGetter<string>): void {
  const { t } = useI18n()
  watchEffect(() => {
    const words = toValue(title)
    document.title = words === '' ? t('session.brand') : t('frame.pageTitle', { page: words, brand: t('session.brand') })
  })
}
