import { defineStore } from 'pinia'
import { computed, ref, watch } from 'vue'
import { measuresSchema, type Preferences } from '../../shared/contract/preferences.ts'
import type { Reader } from '../../shared/messages/readFigure.ts'
import type { Language } from '../../shared/messages/translate.ts'
import type { Measure } from '../../shared/units/inMeasures.ts'
import { UNIT_SYSTEMS, type UnitSystem } from '../../shared/units/readingUnit.ts'
import { readLanguage, showLanguage } from '../plugins/i18n.ts'
import { readSetting, writeSetting } from './settings.ts'

/** Day, or dark for the cab before sunrise. */
export type Light = 'day' | 'dawn'

const one = (unit: Measure['unit'], value = '1'): Measure => ({ name: null, value, unit })
/** What stands in most mixing sheds and kitchens, until a person says otherwise. */
const USUAL_MEASURES: Measure[] = [one('galUS'), one('qtUS'), one('cupUS'), one('tbspUS'), one('tspUS'), one('lb'), one('oz')]

/** What a person chose: language, light, what figures are read in, and the measures at hand. */
export const usePreferences = defineStore('preferences', () => {
  const language = ref<Language>(readSetting('language', ['en', 'es']) ?? languageOfDevice())
  const light = ref<Light>(readSetting('light', ['day', 'dawn']) ?? 'day')
  /** What every figure on the screens is read in: `useOwnUnits` follows the person and the farm; this device has it until they are read. */
  const units = ref<UnitSystem>(readSetting('units', UNIT_SYSTEMS) ?? 'metric')
  const reader = computed<Reader>(() => ({ language: language.value, units: units.value }))
  watch(units, (value) => { writeSetting('units', value) })

  watch(language, (value) => {
    writeSetting('language', value)
    showLanguage(value)
    document.documentElement.lang = value
  }, { immediate: true })

  watch(light, (value) => {
    writeSetting('light', value)
    document.documentElement.dataset['light'] = value
  }, { immediate: true })

  /** The account's own language, unless this device has been told another or cannot read it now. */
  async function offerLanguage(value: Language): Promise<void> {
    if (readSetting('language.chosen', ['yes']) !== null) return
    try {
      await takeLanguage(value)
    } catch { /* It stays as it was; the choice is in the frame. */ }
  }

  /** The account's own light, unless this device has been told another. */
  function offerLight(value: Light | undefined): void {
    if (value !== undefined && readSetting('light.chosen', ['yes']) === null) light.value = value
  }

  function chooseLight(value: Light): void {
    light.value = value
    writeSetting('light.chosen', 'yes')
  }

  /** @throws where the words cannot be read, as without signal; the language then stays as it was. */
  async function chooseLanguage(value: Language): Promise<void> {
    await takeLanguage(value)
    writeSetting('language.chosen', 'yes')
  }

  let asked: Language = language.value
  /** Of two choices the later one stands, whichever was read first. */
  async function takeLanguage(value: Language): Promise<void> {
    asked = value
    await readLanguage(value)
    if (asked === value) language.value = value
  }

  /** Reads the words before anything is shown. */
  async function start(): Promise<void> {
    await readLanguage(language.value)
    showLanguage(language.value)
  }

  const measures = ref<Record<string, Measure[]>>({})
  /** The measures that an account has at hand: those this device keeps while the account could not be told, else the account's own. */
  function measuresOf(accountId: string, own: Preferences['measures']): Measure[] {
    return measures.value[accountId] ?? readMeasures(accountId) ?? own ?? USUAL_MEASURES
  }
  /** @param chosen null once the account holds them. */
  function keepMeasures(accountId: string, chosen: Measure[] | null): void {
    const others = Object.entries(measures.value).filter(([id]) => id !== accountId)
    measures.value = { ...Object.fromEntries(others), ...(chosen && { [accountId]: chosen }) }
    writeSetting(`measures.${accountId}`, chosen && JSON.stringify(chosen))
  }

  return { language, light, units, reader, offerLanguage, offerLight, chooseLight, chooseLanguage, start, measuresOf, keepMeasures }
})

function languageOfDevice(): Language {
  return navigator.language.toLowerCase().startsWith('es') ? 'es' : 'en'
}

function readMeasures(accountId: string): Measure[] | null {
  try {
    const read = measuresSchema.safeParse(JSON.parse(readSetting(`measures.${accountId}`) ?? 'null'))
    return read.success ? read.data : null
  } catch {
    return null
  }
}
