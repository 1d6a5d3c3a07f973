import type { Request } from 'express'
import { deviceWords } from '../../shared/devices/deviceWords.ts'
import type { Origin } from '../database/actor.ts'
import { truncateAddress } from '../services/truncateAddress.ts'

/** From where a request came, as far as it is kept. */
export const originOf = (request: Request): Origin => ({ network: truncateAddress(request.ip), device: deviceWords(request.get('User-Agent')) })
