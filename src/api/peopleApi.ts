import { factorAskedSchema, personPapersSchema, personSchema, type Person, type PersonPaper } from '../../shared/contract/person.ts'
import { allPages } from './allPages.ts'
import { http } from './http.ts'

/** The people of a farm, their training and licences. */
export const peopleApi = {
  list: (farmId: string): Promise<Person[]> => allPages(`/farms/${farmId}/people`, personSchema),
  factorAsked: (farmId: string): Promise<boolean> => http.get(`/farms/${farmId}/second-factor`, factorAskedSchema).then(({ asked }) => asked),
  papers: (farmId: string): Promise<PersonPaper[]> => http.get(`/farms/${farmId}/person-papers`, personPapersSchema).then(({ items }) => items),
}
