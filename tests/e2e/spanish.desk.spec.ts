import type { Page } from '@playwright/test'
import { en } from '../../shared/messages/en.ts'
import { es } from '../../shared/messages/es.ts'
import { RecordForm } from './support/recordForm.ts'
import { listScreens, openScreen, walkScreens } from './support/screens.ts'
import { expect, test } from './support/test.ts'
import { say } from './support/words.ts'

/** Words by their id. */
function flatten(words: object, before = ''): Map<string, string> {
  return new Map(Object.entries(words).flatMap(([name, value]: [string, unknown]) =>
    typeof value === 'string' ? [[`${before}${name}`, value] as const] : [...flatten(value as object, `${before}${name}.`)]))
}

const spanish = flatten(es)
const spanishWords = new Set(spanish.values())
/** English sentences and labels that no Spanish message shares; those with params are left to their unit tests. */
const english = new Set([...flatten(en)].filter(([id, words]) => spanish.get(id) !== words && !spanishWords.has(words) && !/[{|@]/.test(words) && words.length > 2).map(([, words]) => words))

/** What a reader sees or hears that is an English message. */
async function englishOn(page: Page): Promise<string[]> {
  const texts = await page.evaluate(() => {
    const walker = document.createTreeWalker(document.body, NodeFilter.SHOW_TEXT)
    const seen: string[] = []
    for (let node = walker.nextNode(); node !== null; node = walker.nextNode()) seen.push(node.textContent?.trim() ?? '')
    const named = [...document.querySelectorAll('[aria-label], [placeholder]')].flatMap((element) => [element.getAttribute('aria-label') ?? '', element.getAttribute('placeholder') ?? ''])
    return [...seen, ...named].filter((text) => text !== '')
  })
  return texts.filter((text) => english.has(text))
}

test('in Spanish no screen keeps an English word', async ({ page, isPhone, signInAs, manager }) => {
  test.slow()
  const screens = await listScreens(manager)
  await page.goto('/signin')
  await page.getByRole('button', { name: say('frame.moreSheet.spanish') }).click()
  await expect(page.locator('html')).toHaveAttribute('lang', 'es')
  const found: string[] = []
  const look = async (name: string): Promise<void> => { for (const text of await englishOn(page)) found.push(`${name}: ${text}`) }
  await look('sign-in')
  await walkScreens(page, screens, ({ name }) => look(name))
  await signInAs('manager')
  await page.goto('/register/new')
  await page.getByRole('button', { name: new RegExp(`^2\\s*${spanish.get('records.steps.happened')}`) }).click()
  await expect(new RecordForm(page, isPhone).page.getByRole('textbox', { name: spanish.get('records.sign.password') ?? '' })).toBeVisible()
  await look('what happened')
  await openScreen(page, '/inputs')
  await page.getByRole('button', { name: spanish.get('inputs.newMaterial') ?? '' }).click()
  await expect(page.getByRole('dialog')).toBeVisible()
  await look('a new material')
  expect(english.size).toBeGreaterThan(300)
  expect(found).toEqual([])
})
