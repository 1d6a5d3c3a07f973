import { en } from './en.ts'
import { es } from './es.ts'
import { teachWords } from './translate.ts'

// Imported once by each process that speaks to everybody: the server, its drawing process, the command line, the tests.
teachWords('en', en)
teachWords('es', es)
