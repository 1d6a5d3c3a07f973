import type { Message } from '../contract/common.ts'
import { words } from './buildCheck.ts'
import type { FactMaterial } from './recordFacts.ts'

/** Where on which label a limit stands. */
export function labelSource({ name, label }: FactMaterial): Message {
  return label?.source
    ? words('checks.source.labelPart', { material: name, part: label.source })
    : words('checks.source.label', { material: name })
}
