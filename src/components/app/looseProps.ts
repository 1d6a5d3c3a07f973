import type { Component } from 'vue'

/**
 * A control of Element Plus without the types of its props: those are written without exactOptionalPropertyTypes
 * and refuse the very strings they take. Only the wrappers of this folder use it.
 */
export function looseProps(control: unknown): Component {
  return control as Component
}
