import type { Locator, Page } from '@playwright/test'
import { expect } from '@playwright/test'

type Place = Page | Locator

const pageOf = (place: Place): Page => ('page' in place ? place.page() : place)

/** Chooses one of a list by its words, all of them where `exact`; types them where the list can be searched. */
export async function choose(place: Place, label: string, option: string, { exact = false } = {}): Promise<void> {
  const box = place.getByRole('combobox', { name: label, exact: true })
  if (await box.evaluate((element) => element.tagName === 'SELECT')) {
    const words = await box.getByRole('option', { includeHidden: true }).filter({ hasText: option }).first().textContent()
    await box.selectOption({ label: words?.trim() ?? '' })
    return
  }
  // The words of the choice lie over the box itself.
  await box.click({ force: true })
  if (await box.isEditable()) await box.fill(option)
  const wanted = pageOf(place).getByRole('option', { name: option, exact }).filter({ visible: true })
  await wanted.click()
  await expect(wanted).toBeHidden()
}

/** Chooses one of a group of radio buttons: the button itself lies unseen under its words. */
export async function segment(place: Place, name: string | RegExp): Promise<void> {
  const radio = pageOf(place).getByRole('radio', typeof name === 'string' ? { name, exact: true } : { name })
  await place.locator('label').filter({ has: radio }).filter({ visible: true }).click()
  await expect(radio).toBeChecked()
}

/** A field by its label. */
export const field = (place: Place, label: string): Locator => place.getByRole('textbox', { name: label, exact: true })
