/** A line of a record as it is read: what it is of, and how it stands. */
export interface ReadFact {
  name: string
  value: string
  /** What kind of value it is, or more about it. */
  note?: string
}
