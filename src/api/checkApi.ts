import { checkCodeAnswerSchema, type CheckCodeAnswer } from '../../shared/contract/record.ts'
import { http } from './http.ts'

/** What an outsider learns from a check code. */
export const checkApi = {
  read: (code: string): Promise<CheckCodeAnswer> => http.get(`/check/${encodeURIComponent(code)}`, checkCodeAnswerSchema),
}
