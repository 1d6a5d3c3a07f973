import { mount } from '@vue/test-utils'
import { createPinia } from 'pinia'
import { defineComponent } from 'vue'
import { ApiError } from '../../../../src/api/errors.ts'
import { i18n } from '../../../../src/plugins/i18n.ts'

/** What a composable gives inside a component, with messages and stores. */
export function inSetup<Made>(compose: () => Made): Made {
  const made: Made[] = []
  mount(defineComponent({ setup() { made.push(compose()); return () => null } }), { global: { plugins: [createPinia(), i18n] } })
  const [first] = made
  if (first === undefined) throw new TypeError('Nothing was set up')
  return first
}

/** The server's refusal of one field. */
export const refusalOf = (path: string, message: string): ApiError =>
  new ApiError({ type: 'about:blank', title: 'no', status: 422, code: 'invalid', detail: 'no', requestId: 'q', errors: [{ path, code: 'field.format', message }] })

/** An answer that comes when it is told to. */
export function laterAnswer<Answer>(answer: Answer): { promise: Promise<Answer>; come: () => void } {
  let come = (): void => undefined
  return { promise: new Promise<Answer>((resolve) => { come = () => { resolve(answer) } }), come: () => { come() } }
}

/** A refusal because another was first, with what stands now. */
export function staleWith(current: unknown): ApiError {
  return new ApiError({ type: 'about:blank', title: 'stale', status: 409, code: 'stale', detail: 'stale', errors: [], requestId: 'r', current })
}
