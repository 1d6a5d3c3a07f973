import { useI18n } from 'vue-i18n'
import type { PersonPaper } from '../../../shared/contract/person.ts'
import { formatDay } from '../../../shared/messages/formatDay.ts'
import { useFarmDay } from '../farm/useFarmDay.ts'
import { useFigures } from '../app/useFigures.ts'

/** Until when a paper of a person holds, as of today on the farm. */
export function usePaperWords(): { holds: (paper: PersonPaper) => string; isOver: (paper: PersonPaper) => boolean } {
  const { t } = useI18n()
  const { language } = useFigures()
  const { today } = useFarmDay()
  const isOver = ({ expiresOn }: PersonPaper): boolean => expiresOn !== null && today.value !== null && expiresOn < today.value
  return {
    isOver,
    holds: (paper) => {
      if (paper.expiresOn === null) return t('people.papers.always')
      return t(isOver(paper) ? 'people.papers.over' : 'people.papers.holds', { day: formatDay(language.value, paper.expiresOn) })
    },
  }
}
