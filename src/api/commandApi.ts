import type { z } from 'zod'
import { blockSchema } from '../../shared/contract/block.ts'
import { farmSchema, sprayerSchema } from '../../shared/contract/farm.ts'
import { lotSchema, materialSchema } from '../../shared/contract/input.ts'
import { recordSchema } from '../../shared/contract/record.ts'
import type { Command, CommandAnswers, CommandKind } from './commandTypes.ts'
import { http } from './http.ts'

interface Door {
  method: 'post' | 'put'
  path: (farmId: string, id: string) => string
  answer: z.ZodType
}

const DOORS: Record<CommandKind, Door> = {
  'farm.create': { method: 'post', path: () => '/farms', answer: farmSchema },
  'block.create': { method: 'post', path: (farmId) => `/farms/${farmId}/blocks`, answer: blockSchema },
  'material.create': { method: 'post', path: (farmId) => `/farms/${farmId}/materials`, answer: materialSchema },
  'lot.create': { method: 'post', path: (farmId) => `/farms/${farmId}/lots`, answer: lotSchema },
  'lot.count': { method: 'post', path: (farmId, id) => `/farms/${farmId}/lots/${id}/count`, answer: lotSchema },
  'sprayer.create': { method: 'post', path: (farmId) => `/farms/${farmId}/sprayers`, answer: sprayerSchema },
  'record.create': { method: 'post', path: (farmId) => `/farms/${farmId}/records`, answer: recordSchema },
  'record.update': { method: 'put', path: (farmId, id) => `/farms/${farmId}/records/${id}`, answer: recordSchema },
  'record.sign': { method: 'post', path: (farmId, id) => `/farms/${farmId}/records/${id}/sign`, answer: recordSchema },
}

/**
 * Sends one command to the address of its kind.
 * @throws {ApiError} when refused, {NetworkError} when no answer came.
 */
export async function sendCommand<Kind extends CommandKind>(command: Command<Kind>): Promise<CommandAnswers[Kind]> {
  const door = DOORS[command.kind]
  const answer = await http[door.method](door.path(command.farmId, command.id), command.body, door.answer)
  return answer as CommandAnswers[Kind]
}
