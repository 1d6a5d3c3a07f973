import { phoneHereSchema, sharedPhonesSchema, type PhoneHere, type SharedPhone } from '../../shared/contract/sharedPhone.ts'
import { http } from './http.ts'

/** Phones of the farm, and signing in by PIN on one. */
export const phoneApi = {
  here: (): Promise<PhoneHere['phone']> => http.get('/shared-phone', phoneHereSchema).then(({ phone }) => phone),
  list: (farmId: string): Promise<SharedPhone[]> => http.get(`/farms/${farmId}/shared-phones`, sharedPhonesSchema).then(({ items }) => items),
}
