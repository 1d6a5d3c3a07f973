import { useI18n } from 'vue-i18n'
import type { PersonPaper } from '../../../shared/contract/person.ts'
import type { CommonDays } from '../../../shared/people/overlapOf.ts'
import { formatDay } from '../../../shared/messages/formatDay.ts'
import { useFarmDay } from '../farm/useFarmDay.ts'
import { useFigures } from '../app/useFigures.ts'

/** Until when a paper of a person holds, as of today on the farm, and on which days another one does too. */
export function usePaperWords(): {
  holds: (paper: PersonPaper) => string
  isOver: (paper: PersonPaper) => boolean
  same: (other: PersonPaper, days: CommonDays) => string
} {
  const { t } = useI18n()
  const { language } = useFigures()
  const { today } = useFarmDay()
  const isOver = ({ expiresOn }: PersonPaper): boolean => expiresOn !== null && today.value !== null && expiresOn < today.value
  return {
    isOver,
    same: ({ title, number }, { from, until }) => {
      const inWords = (day: string | null): string => (day === null ? '' : formatDay(language.value, day))
      const which = from === null ? (until === null ? 'open' : 'until') : until === null ? 'from' : 'span'
      return t(`people.papers.same.${which}`, { other: number === null ? title : `${title}, ${number}`, from: inWords(from), until: inWords(until) })
    },
    holds: (paper) => {
      if (paper.expiresOn === null) return t('people.papers.always')
      return t(isOver(paper) ? 'people.papers.over' : 'people.papers.holds', { day: formatDay(language.value, paper.expiresOn) })
    },
  }
}
