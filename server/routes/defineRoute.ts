import type { Request, Response } from 'express'
import type { z } from 'zod'
import type { Role } from '../../shared/contract/session.ts'
import type { Language } from '../../shared/messages/translate.ts'
import type { FarmActor } from '../database/actor.ts'
import type { UploadedFile } from '../services/files/judgeFile.ts'
import type { Services } from '../services/services.ts'
import type { SessionKind } from '../services/sessions/recordSession.ts'

/** Who may call: everybody, any signed-in account, or those roles on the farm named in the path. */
export type RouteRoles = 'everybody' | 'account' | readonly Role[]

type Parsed<Schema> = Schema extends z.ZodType ? z.output<Schema> : Record<string, never>
type ActorOf<Roles> = Roles extends readonly Role[] ? FarmActor : null

export interface RouteCall<Params, Query, Body, Actor, File = null> {
  params: Params
  query: Query
  body: Body
  actor: Actor
  /** The file beside the fields, on a route that takes one. */
  file: File
  accountId: string
  language: Language
  services: Services
  /** Judges the e-mail and password in the body and opens a session; the account's id, or null. */
  authenticate(): Promise<string | null>
  /** Opens a session for an account that was judged by its PIN. */
  openFor(accountId: string, kind: SessionKind): Promise<void>
  request: Request
  response: Response
}

/** What a route says: a body to be sent as JSON with its status, or `sent` when it wrote the answer itself. */
export type RouteAnswer<Answer> = { status?: number; body: Answer } | 'sent'

export interface RouteDefinition<
  Roles extends RouteRoles,
  Params extends z.ZodType | undefined,
  Query extends z.ZodType | undefined,
  Body extends z.ZodType | undefined,
  Answer extends z.ZodType,
  Upload extends boolean,
> {
  method: 'get' | 'post' | 'put' | 'patch' | 'delete'
  path: string
  /** One sentence for the API's page. */
  summary: string
  roles: Roles
  params?: Params
  query?: Query
  body?: Body
  answer: Answer
  /** What the answer is when it is not JSON. */
  contentType?: string
  /** A password is tried here: attempts are limited. */
  guardsPassword?: boolean
  /** Takes multipart/form-data: one file, and the fields of `body` beside it. It is read once the rights are known. */
  upload?: Upload
  run(call: RouteCall<Parsed<Params>, Parsed<Query>, Parsed<Body>, ActorOf<Roles>, Upload extends true ? UploadedFile : null>): Promise<RouteAnswer<z.input<Answer>>>
}

/** A route after its types have done their work; router, OpenAPI and the role matrix are made from it. */
export interface Route {
  method: 'get' | 'post' | 'put' | 'patch' | 'delete'
  path: string
  summary: string
  roles: RouteRoles
  params: z.ZodType | undefined
  query: z.ZodType | undefined
  body: z.ZodType | undefined
  answer: z.ZodType
  contentType: string | undefined
  guardsPassword: boolean
  upload: boolean
  run(call: RouteCall<unknown, unknown, unknown, FarmActor | null, UploadedFile | null>): Promise<RouteAnswer<unknown>>
}

/**
 * One description of a route: router, checks, OpenAPI and the role × route matrix come from it.
 * @throws {Error} at start if the roles are missing or do not fit the path.
 */
export function defineRoute<
  const Roles extends RouteRoles,
  Answer extends z.ZodType,
  Params extends z.ZodType | undefined = undefined,
  Query extends z.ZodType | undefined = undefined,
  Body extends z.ZodType | undefined = undefined,
  const Upload extends boolean = false,
>(definition: RouteDefinition<Roles, Params, Query, Body, Answer, Upload>): Route {
  const { roles, path } = definition
  const onFarm = path.startsWith('/farms/:farmId')
  if (!roles || roles.length === 0) throw new Error(`Route ${path} names no roles`)
  if (onFarm !== Array.isArray(roles)) throw new Error(`Route ${path}: farm roles and a farm in the path go together`)
  return {
    method: definition.method,
    path,
    summary: definition.summary,
    roles,
    params: definition.params,
    query: definition.query,
    body: definition.body,
    answer: definition.answer,
    contentType: definition.contentType,
    guardsPassword: definition.guardsPassword ?? false,
    upload: definition.upload ?? false,
    // The parsers above have made each part what `run` says it takes.
    run: definition.run as Route['run'],
  }
}
