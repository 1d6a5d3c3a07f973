import type { RecordContent } from '../contract/recordContent.ts'

/** A field of a record that is plain words. */
interface PlainField {
  name: keyof RecordContent
  /** The step of the form it is asked in. */
  step: 'ready' | 'happened'
  /** Runs over several lines and stands under a head of its own. */
  isLong: boolean
  /** Goes along into a new record like this one. */
  carriesOver: boolean
}

/** The plain fields of a record. Form, page and PDF walk this list; their words stand under `records.plain`. */
export const PLAIN_FIELDS = [
  { name: 'purpose', step: 'ready', isLong: false, carriesOver: true },
  { name: 'licence', step: 'happened', isLong: false, carriesOver: true },
  { name: 'notes', step: 'happened', isLong: true, carriesOver: false },
] as const satisfies readonly PlainField[]

export type PlainName = (typeof PLAIN_FIELDS)[number]['name']

/** Every plain field, made by its name. */
export function mapPlainFields<Value>(make: (field: (typeof PLAIN_FIELDS)[number]) => Value): Record<PlainName, Value> {
  return Object.fromEntries(PLAIN_FIELDS.map((field) => [field.name, make(field)])) as Record<PlainName, Value>
}
