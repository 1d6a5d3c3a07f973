/** One of a list. */
export interface SelectOption {
  value: string
  label: string
  note?: string
  disabled?: boolean
}

/** What both kinds of list are given by the field around them. */
export interface SelectProps {
  id: string
  label: string
  options: readonly SelectOption[]
  placeholder: string
  filterable?: boolean
  clearable?: boolean
  disabled?: boolean
  describedBy: string | undefined
  invalid: true | undefined
}
