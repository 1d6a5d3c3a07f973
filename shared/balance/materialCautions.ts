import type { Material } from '../contract/input.ts'
import type { MessageId } from '../messages/en.ts'

type Kind = Material['kind']

const BY_KIND: Record<Kind, readonly MessageId[]> = {
  ferment: ['inputs.caution.gas', 'inputs.caution.raw'],
  extract: ['inputs.caution.acid'],
  microbial: ['inputs.caution.gas'],
  mineral: ['inputs.caution.label', 'inputs.caution.dust'],
  soap: ['inputs.caution.label'],
  oil: ['inputs.caution.label'],
  compost: ['inputs.caution.raw'],
  seaweed: [],
  other: [],
}

/** How a material can hurt whoever handles it, by its kind, as message ids; jars that look like drinks always come last. */
export function materialCautions(kind: Kind, hasLabel: boolean): MessageId[] {
  const ofLabel: MessageId[] = hasLabel && !BY_KIND[kind].includes('inputs.caution.label') ? ['inputs.caution.label'] : []
  return [...ofLabel, ...BY_KIND[kind], 'inputs.caution.jars']
}
