import type { ZodError, core } from 'zod'
import type { FieldError } from '../errors.ts'

const OWN_CODE = /^[a-z_]+\.[a-z_]+$/

/** The faults of a parsed request as fields with codes of `problems`; unknown keys are one fault each. */
export function findFieldErrors(error: ZodError): FieldError[] {
  return error.issues.flatMap(fromIssue)
}

function fromIssue(issue: core.$ZodIssue): FieldError[] {
  const path = issue.path.join('.')
  if (OWN_CODE.test(issue.message)) return [{ path, code: issue.message }]
  switch (issue.code) {
    case 'unrecognized_keys':
      return issue.keys.map((key) => ({ path: [...issue.path, key].join('.').slice(0, 80), code: 'unknown_field' }))
    case 'invalid_value':
      return [{ path, code: 'field.choice', params: { options: issue.values.slice(0, 12).join(', ') } }]
    case 'too_small':
      return [{ path, code: 'field.too_small', params: { minimum: Number(issue.minimum) } }]
    case 'too_big':
      return [{ path, code: 'field.too_big', params: { maximum: Number(issue.maximum) } }]
    case 'invalid_type':
      return [{ path, code: issue.message.endsWith('received undefined') ? 'field.required' : 'field.type', params: { expected: issue.expected } }]
    default:
      return [{ path, code: 'field.format' }]
  }
}
