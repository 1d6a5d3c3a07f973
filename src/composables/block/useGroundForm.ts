import { computed, reactive, ref, type ComputedRef, type Ref } from 'vue'
import { useI18n } from 'vue-i18n'
import {
  changeGroundSchema, changeSiteSchema, createGroundSchema, createSiteSchema, type GroundFeature, type GroundKind, type Site, type SiteKind,
} from '../../../shared/contract/ground.ts'
import { groundFault } from '../../../shared/geo/groundFault.ts'
import { parseQuantityText } from '../../../shared/units/parseQuantityText.ts'
import { useSession } from '../../stores/session.ts'
import { fieldErrors } from '../form/fieldErrors.ts'
import { newId } from '../form/newId.ts'
import { useMessages } from '../app/useMessages.ts'
import { LEAST_POINTS, type PlaceDrawing } from './usePlaceDrawing.ts'
import { useSchemaErrors } from '../form/useSchemaErrors.ts'
import { useSubmit } from '../form/useSubmit.ts'
import { useTask } from '../form/useTask.ts'

/** What the form is about: a new one, or one that is there. */
export type GroundSubject = { what: 'site'; was: Site | null } | { what: 'ground'; was: GroundFeature | null }

/** The words of the form; `id` and `revision` are of what is saved. */
export interface GroundWords { id: string; revision: number; kind: SiteKind | GroundKind | null; name: string; metres: string; note: string; endedOn: string | null }

/** The form of a site or of a piece of the ground plan; `metres` is the distance of the one and the width of the other. */
export interface GroundForm {
  draft: GroundWords
  errors: ComputedRef<Record<string, string>>
  /** Why it was not saved, where no field is to blame. */
  refusal: ComputedRef<string>
  busy: Ref<boolean>
  /** Null where it was refused; the reasons then stand in `errors` and `refusal`. */
  save: () => Promise<'sent' | 'kept' | null>
}

export function useGroundForm(subject: GroundSubject, drawing: PlaceDrawing): GroundForm {
  const { t } = useI18n()
  const session = useSession()
  const { submit } = useSubmit()
  const { problem } = useMessages()
  const schemaErrors = useSchemaErrors()
  const { what, was } = subject
  const draft = reactive<GroundWords>({
    id: was?.id ?? newId(), revision: was?.revision ?? 0, kind: was?.kind ?? null, name: was?.name ?? '', metres: (what === 'site' ? subject.was?.keepClearM : subject.was?.widthM) ?? '',
    note: (what === 'site' ? subject.was?.note : null) ?? '', endedOn: was?.endedOn ?? null,
  })
  const own = ref<Record<string, string>>({})
  const task = useTask((body: object) => submit(commandOf(body)))
  const refused = computed(() => fieldErrors(task.error.value))

  function bodyOf(): Record<string, unknown> {
    const metres = parseQuantityText(draft.metres)
    const given = draft.metres.trim() === '' ? null : metres.ok ? metres.value : draft.metres
    const isLine = drawing.geometry.value?.type === 'LineString'
    const facts = { kind: draft.kind, geometry: drawing.geometry.value, endedOn: draft.endedOn, ...(was === null ? { id: draft.id } : { revision: draft.revision }) }
    if (what === 'site') return { ...facts, name: draft.name, keepClearM: given, note: textOf(draft.note) }
    return { ...facts, name: textOf(draft.name), widthM: isLine ? given : null }
  }

  function commandOf(body: object): Parameters<typeof submit>[0] {
    const act = was === null ? 'create' : 'change'
    return { kind: `${what}.${act}`, farmId: session.farmId, id: draft.id, body } as Parameters<typeof submit>[0]
  }

  /** What the drawing lacks or cannot be, in words; empty where nothing is. */
  function drawingFault(): string {
    const { geometry, shape, points, findings } = drawing
    if (geometry.value === null) {
      const [finding] = findings.value
      if (finding !== undefined) return t(`problems.${finding.code}`, finding.params)
      return points.value.length < LEAST_POINTS[shape.value] ? t(`ground.form.needed.${shape.value}`) : t('problems.geometry.place_type')
    }
    const fault = what === 'ground' && draft.kind !== null ? groundFault({ kind: draft.kind as GroundKind, geometry: geometry.value, widthM: null }) : null
    return fault === null ? '' : t(`problems.${fault.code}`)
  }

  async function save(): Promise<'sent' | 'kept' | null> {
    if (task.running.value) return null
    const body = bodyOf()
    const schema = { site: [createSiteSchema, changeSiteSchema], ground: [createGroundSchema, changeGroundSchema] }[what][was === null ? 0 : 1]
    task.error.value = null
    const found = schema === undefined ? {} : schemaErrors(schema, body)
    const drawn = drawingFault()
    own.value = { ...found, ...(drawn === '' ? {} : { geometry: drawn }) }
    if (Object.keys(own.value).length > 0) return null
    return (await task.run(body))?.state ?? null
  }

  const errors = computed(() => {
    const all = { ...refused.value, ...own.value }
    const metres = all['keepClearM'] ?? all['widthM']
    return metres === undefined ? all : { ...all, metres }
  })
  return {
    draft, errors, busy: task.running, save,
    refusal: computed(() => (task.error.value === null || Object.keys(refused.value).length > 0 ? '' : problem(task.error.value))),
  }
}

const textOf = (words: string): string | null => (words.trim() === '' ? null : words)
