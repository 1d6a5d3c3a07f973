import { v7 as uuidV7 } from 'uuid'
import type { FileKind } from '../../shared/contract/attachment.ts'
import type { FarmActor } from '../database/actor.ts'
import { addFile } from '../services/files/addFile.ts'
import type { Services } from '../services/services.ts'
import { drawPaper, drawPhoto } from './drawFiles.ts'

/** A photo of the spray that is under way. */
export async function seedBegunPhoto(services: Services, actor: FarmActor, recordId: string): Promise<void> {
  await add(services, actor, recordId, { kind: 'photo', name: 'Tank before the first load.jpg', bytes: await drawPhoto({ rows: 9 }) })
}

/** What stood beside the load that went on too strong when it was signed. */
export async function seedStoppedFiles(services: Services, actor: FarmActor, recordId: string): Promise<void> {
  await add(services, actor, recordId, { kind: 'photo', name: 'Leaves after the soap.jpg', bytes: await drawPhoto({ sky: '#d9c9b0', leaf: '#7d8a3e', rows: 5 }) })
  const label = await drawPaper('Soap, label as bought', ['Dilute 1 part to 50 parts of water or more.', 'Keep off when the leaf is in full sun.'], services.clock.now())
  await add(services, actor, recordId, { kind: 'paper', name: 'Soap label.pdf', bytes: label })
}

/** What came to it after the signature. */
export async function seedLatePhoto(services: Services, actor: FarmActor, recordId: string): Promise<void> {
  await add(services, actor, recordId, { kind: 'photo', name: 'The same rows a day later.jpg', bytes: await drawPhoto({ leaf: '#6d8446', rows: 5 }) })
}

/** The neighbour's own paper. */
export async function seedNeighbourPaper(services: Services, actor: FarmActor, recordId: string): Promise<void> {
  const bytes = await drawPaper('Whey, delivery note', ['One hundred litres, from the dairy at Skerrow.'], services.clock.now())
  await add(services, actor, recordId, { kind: 'paper', name: 'Delivery note.pdf', bytes })
}

async function add(services: Services, actor: FarmActor, recordId: string, { kind, name, bytes }: { kind: FileKind; name: string; bytes: Buffer }): Promise<void> {
  await addFile(services, actor, { about: 'record', id: recordId }, { id: uuidV7(), kind }, { name, announced: '', bytes })
}
