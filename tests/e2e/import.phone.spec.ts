import { findFaults } from './support/axe.ts'
import { blocksOf, ImportForm, openNewFarm } from './support/importForm.ts'
import { expect, test } from './support/test.ts'

test('a projected shapefile from a surveyor comes in on the phone', async ({ page, context }) => {
  const farmId = await openNewFarm(context)
  const form = new ImportForm(page)
  await form.open()
  await form.choose('utm.zip')
  await expect(form.count(40, 38, 2, 0)).toBeVisible()
  await expect(form.main.getByText('WGS 1984 UTM Zone 10N')).toBeVisible()
  await form.shape(3).getByRole('checkbox').uncheck()
  await expect(form.count(40, 37, 2, 1)).toBeVisible()
  expect(await findFaults(page)).toEqual([])
  await form.importButton.click()
  await expect(page).toHaveURL(/\/blocks$/)
  expect(await blocksOf(context, farmId)).toHaveLength(37)
})
