import type { Check, Verdict } from '../contract/record.ts'
import type { Message } from '../contract/common.ts'
import { buildCheck, words } from './buildCheck.ts'
import type { FactMaterial } from './recordFacts.ts'

function statusWords({ organicStatus, statusBasis }: FactMaterial): { verdict: Verdict; text: Message } {
  const basis = statusBasis ?? ''
  switch (organicStatus) {
    case 'prohibited':
      return { verdict: 'stop', text: basis ? words('checks.status.prohibited', { basis }) : words('checks.status.prohibitedBare') }
    case 'restricted':
      return { verdict: 'caution', text: basis ? words('checks.status.restricted', { basis }) : words('checks.status.restrictedBare') }
    case 'allowed':
      return basis
        ? { verdict: 'pass', text: words('checks.status.allowed', { basis }) }
        : { verdict: 'unknown', text: words('checks.status.allowedBare') }
    case 'unknown':
      return { verdict: 'unknown', text: words('checks.status.unknown') }
  }
}

/** Whether organic land may take a material, as far as the farm has written down and on what that rests. */
export function judgeStatus(material: FactMaterial, about: string): Check {
  return buildCheck({
    code: 'certifier.status',
    rests: 'certifier',
    title: words('checks.status.title', { material: material.name }),
    about,
    ...statusWords(material),
  })
}
