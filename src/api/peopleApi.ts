import { personSchema, type Person } from '../../shared/contract/person.ts'
import { allPages } from './allPages.ts'

/** The people of a farm. */
export const peopleApi = {
  list: (farmId: string): Promise<Person[]> => allPages(`/farms/${farmId}/people`, personSchema),
}
