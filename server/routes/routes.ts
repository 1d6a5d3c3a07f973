import { blockRoutes } from './blockRoutes.ts'
import { certificateRoutes } from './certificateRoutes.ts'
import type { Route } from './defineRoute.ts'
import { farmRoutes } from './farmRoutes.ts'
import { fileRoutes } from './fileRoutes.ts'
import { grantRoutes } from './grantRoutes.ts'
import { heldPaperRoutes } from './heldPaperRoutes.ts'
import { groundRoutes } from './groundRoutes.ts'
import { growingRoutes } from './growingRoutes.ts'
import { holdRoutes } from './holdRoutes.ts'
import { inputRoutes } from './inputRoutes.ts'
import { journalRoutes } from './journalRoutes.ts'
import { letterRoutes } from './letterRoutes.ts'
import { linkRoutes } from './linkRoutes.ts'
import { meRoutes } from './meRoutes.ts'
import { openRoutes } from './openRoutes.ts'
import { peopleRoutes } from './peopleRoutes.ts'
import { paperRoutes } from './paperRoutes.ts'
import { phoneRoutes } from './phoneRoutes.ts'
import { recordLifeRoutes } from './recordLifeRoutes.ts'
import { recordRoutes } from './recordRoutes.ts'
import { registerRoutes } from './registerRoutes.ts'
import { reportRoutes } from './reportRoutes.ts'
import { roundRoutes } from './roundRoutes.ts'
import { seasonRoutes } from './seasonRoutes.ts'
import { sessionRoutes } from './sessionRoutes.ts'
import { sprayerRoutes } from './sprayerRoutes.ts'
import { startRoutes } from './startRoutes.ts'

/** Every route under /api; router, OpenAPI, its page and the role × route matrix are made from this list. */
export const ROUTES: Route[] = [
  ...openRoutes, ...linkRoutes, ...sessionRoutes, ...meRoutes, ...phoneRoutes, ...peopleRoutes, ...paperRoutes,
  ...farmRoutes, ...certificateRoutes, ...letterRoutes, ...startRoutes, ...sprayerRoutes, ...blockRoutes, ...holdRoutes, ...groundRoutes, ...growingRoutes, ...inputRoutes, ...recordRoutes, ...recordLifeRoutes, ...registerRoutes, ...reportRoutes, ...roundRoutes, ...fileRoutes, ...heldPaperRoutes,
  ...seasonRoutes, ...grantRoutes, ...journalRoutes,
]
