import type { Page } from '@playwright/test'
import { z } from 'zod'
import { attachmentSchema, type Attachment } from '../../shared/contract/attachment.ts'
import { drawPaper, drawPhoto } from '../../server/demo/drawFiles.ts'
import { findFaults } from './support/axe.ts'
import type { FarmApi } from './support/demoFarm.ts'
import { RecordForm } from './support/recordForm.ts'
import { expect, test } from './support/test.ts'
import { makeSignedRecord, makeThings } from './support/things.ts'
import { say } from './support/words.ts'

test.use({ readsAhead: true })

const filesOf = async (api: FarmApi, recordId: string): Promise<Attachment[]> =>
  (await api.get(`/records/${recordId}/files`, z.object({ items: z.array(attachmentSchema), next: z.null() }))).items

async function add(page: Page, kind: 'photo' | 'paper', name: string, buffer: Buffer, mimeType = 'image/jpeg'): Promise<void> {
  await page.locator(`[data-add="${kind}"]`).setInputFiles({ name, mimeType, buffer })
}

const row = (page: Page, name: string) => page.getByRole('listitem').filter({ hasText: name })

test('what is added before the signature is in it, what comes later says so', async ({ page, isPhone, signInAs, manager }) => {
  await signInAs('manager')
  const things = await makeThings(manager)
  const form = new RecordForm(page, isPhone)
  await form.open()
  await form.fillDrench(things)
  await form.start()
  await add(page, 'photo', 'Rows before.jpg', await drawPhoto())
  await expect(row(page, 'Rows before.jpg').getByRole('button', { name: 'Rows before.jpg', exact: true })).toBeVisible()
  await add(page, 'photo', 'Wrong one.jpg', await drawPhoto({ rows: 3 }))
  await row(page, 'Wrong one.jpg').getByRole('button', { name: say('files.removeName', { name: 'Wrong one.jpg' }) }).click()
  await page.getByRole('button', { name: say('files.removeSure') }).click()
  await expect(row(page, 'Wrong one.jpg')).toHaveCount(0)
  await form.endNow()
  await form.sign()
  await expect(page.getByText(/^Signed as \d{4}-\d{4}\.$/)).toBeVisible()
  await page.getByRole('button', { name: say('records.signed.open') }).click()

  const before = row(page, 'Rows before.jpg')
  await expect(before).toBeVisible()
  await expect(before).not.toContainText(say('files.afterSignature'))
  await expect(before.getByRole('button', { name: say('files.removeName', { name: 'Rows before.jpg' }) })).toHaveCount(0)
  await add(page, 'paper', 'Label.pdf', await drawPaper('Label', ['1 part to 20'], new Date(0)), 'application/pdf')
  await expect(row(page, 'Label.pdf')).toContainText(say('files.afterSignature'))
  await expect.poll(() => before.locator('img').evaluate((image: HTMLImageElement) => image.naturalWidth)).toBe(360)
  expect(await findFaults(page)).toEqual([])

  await before.getByRole('button', { name: 'Rows before.jpg', exact: true }).click()
  const dialog = page.getByRole('dialog', { name: 'Rows before.jpg' })
  await expect.poll(() => dialog.getByRole('img', { name: say('files.alt', { name: 'Rows before.jpg' }) }).evaluate((image: HTMLImageElement) => image.naturalWidth)).toBe(1600)
  const [saved] = await Promise.all([page.waitForEvent('download'), dialog.getByRole('link', { name: say('files.saveOriginal') }).click()])
  expect(saved.suggestedFilename()).toBe('Rows before.jpg')
})

test('without signal a photo waits with its draft, and goes before the signature', async ({ page, context, isPhone, signInAs, manager }) => {
  await signInAs('manager')
  const things = await makeThings(manager)
  const form = new RecordForm(page, isPhone)
  await form.open()
  await form.fillDrench(things)
  await context.setOffline(true)
  await form.step(2).click()
  await add(page, 'photo', 'In the rows.jpg', await drawPhoto())
  await expect(row(page, 'In the rows.jpg')).toContainText(say('files.waitsForRecord'))
  await context.setOffline(false)
  await page.reload()
  await expect(row(page, 'In the rows.jpg')).toContainText(say('files.waitsForRecord'))
  const id = new URL(page.url()).searchParams.get('draft') ?? ''
  await page.getByRole('button', { name: `${say('records.happened.start')}: ${say('records.happened.now')}` }).click()
  await form.endNow()
  await form.sign()
  await expect(page.getByText(/^Signed as \d{4}-\d{4}\.$/)).toBeVisible()
  expect((await filesOf(manager, id)).map(({ label, signedVersion }) => [label, signedVersion])).toEqual([['In the rows.jpg', 1]])
})

test('what cannot be taken is said in a sentence, and the rest goes', async ({ page, signInAs, manager }) => {
  const record = await makeSignedRecord(manager, await makeThings(manager))
  await signInAs('manager')
  await page.goto(`/register/${record.id}`)
  await expect(page.getByText(say('files.noneYet'))).toBeVisible()
  await page.locator('[data-add="photo"]').setInputFiles([
    { name: 'IMG_1.HEIC', mimeType: 'image/heic', buffer: Buffer.from('x') },
    { name: 'words.jpg', mimeType: 'image/jpeg', buffer: Buffer.from('only words, and enough of them') },
    { name: 'cut.jpg', mimeType: 'image/jpeg', buffer: (await drawPhoto()).subarray(0, 2000) },
    { name: 'good.jpg', mimeType: 'image/jpeg', buffer: await drawPhoto() },
  ])
  await expect(page.getByText(`IMG_1.HEIC: ${say('problems.file.camera_only')}`)).toBeVisible()
  await expect(page.getByText(`words.jpg: ${say('problems.file.type')}`)).toBeVisible()
  await expect(row(page, 'cut.jpg')).toContainText(say('problems.image.broken'))
  await expect(row(page, 'good.jpg')).toContainText(say('files.afterSignature'))
  await expect(row(page, 'words.jpg')).toHaveCount(0)
  expect((await filesOf(manager, record.id)).map(({ label }) => label)).toEqual(['good.jpg'])
})

test('a certifier reads them and changes nothing', async ({ page, signInAs, manager }) => {
  const record = await makeSignedRecord(manager, await makeThings(manager))
  await signInAs('certifier')
  await page.goto(`/register/${record.id}`)
  await expect(page.getByText(say('files.none'))).toBeVisible()
  await expect(page.getByRole('button', { name: say('files.addPhoto') })).toHaveCount(0)
})
