import { computed, reactive, ref, watch, type ComputedRef, type Ref } from 'vue'
import { createPlanSchema, seasonPlanSchema, updatePlanSchema, type SeasonPlan } from '../../../shared/contract/seasonPlan.ts'
import type { Method } from '../../../shared/contract/recordContent.ts'
import type { UnitSystem } from '../../../shared/units/readingUnit.ts'
import { usePreferences } from '../../stores/preferences.ts'
import { useSession } from '../../stores/session.ts'
import { fieldErrors } from '../form/fieldErrors.ts'
import { newId } from '../form/newId.ts'
import { numberOf } from '../record/recordContent.ts'
import { draftOfPlan, type ComponentDraft, type RecordDraft } from '../record/recordDraft.ts'
import { useKeptForm } from '../form/useKeptForm.ts'
import { useMerge, type Merge } from '../form/useMerge.ts'
import { useMessages } from '../app/useMessages.ts'
import { useSchemaErrors } from '../form/useSchemaErrors.ts'
import { useSubmit } from '../form/useSubmit.ts'
import { useTask } from '../form/useTask.ts'

/** A step as typed; `water.sizedFrom` is empty where that is decided on the day. */
export interface StepDraft {
  id: string
  method: Method
  component: ComponentDraft
  water: Omit<RecordDraft['water'], 'sizedFrom'> & { sizedFrom: RecordDraft['water']['sizedFrom'] | '' }
  blockIds: string[]
  everyDays: string
  firstOn: string | null
  lastOn: string | null
  earlyDays: string
  lateDays: string
}

/** A plan as typed; the id stays with it, so that sending twice makes one. */
export interface PlanDraft { id: string; name: string; note: string; steps: StepDraft[] }

export interface PlanForm {
  draft: PlanDraft
  /** False until the device has answered. */
  ready: Ref<boolean>
  /** It was begun earlier and is brought back. */
  resumed: Ref<boolean>
  /** Forgets what was typed. */
  beginAnew: () => Promise<void>
  /** Path of the field, `steps.0.everyDays`, to its sentence. */
  errors: ComputedRef<Record<string, string>>
  /** Why it was not saved, where no field is to blame. */
  refusal: ComputedRef<string>
  busy: Ref<boolean>
  /** Where another changed the plan meanwhile; null of a new one. */
  merge: Merge<PlanDraft> | null
  addStep: () => void
  removeStep: (index: number) => void
  /** Null where it was refused. */
  save: () => Promise<'sent' | 'kept' | null>
  end: (reason: string) => Promise<boolean>
  reopen: () => Promise<boolean>
}

const copyOf = (typed: PlanDraft): PlanDraft => JSON.parse(JSON.stringify(typed)) as PlanDraft

function emptyStep(units: UnitSystem): StepDraft {
  const { method, components, water } = draftOfPlan({ method: 'foliar', materialId: '', basis: { kind: 'ratio', parts: '20', reading: 'to' }, water: null }, units)
  return {
    id: newId(), method, component: components[0] as ComponentDraft, water: { ...water, sizedFrom: '' }, blockIds: [], everyDays: '14', firstOn: null, lastOn: null, earlyDays: '2', lateDays: '4',
  }
}

function draftOfStep(step: SeasonPlan['steps'][number]): StepDraft {
  const { components, water } = draftOfPlan(step)
  return {
    // Known by its step: two drafts of one plan differ in nothing.
    id: step.id, method: step.method, component: { ...(components[0] as ComponentDraft), key: step.id }, water: step.water === null ? { ...water, sizedFrom: '' } : water, blockIds: [...step.blockIds],
    everyDays: String(step.everyDays), firstOn: step.firstOn, lastOn: step.lastOn, earlyDays: String(step.earlyDays), lateDays: String(step.lateDays),
  }
}

const draftOfSeasonPlan = ({ id, name, note, steps }: SeasonPlan): PlanDraft => ({ id, name, note: note ?? '', steps: steps.map(draftOfStep) })

/** The form of a season plan: a new one, or one that is there. */
export function usePlanForm(was: SeasonPlan | null): PlanForm {
  const session = useSession()
  const { units } = usePreferences()
  const { submit } = useSubmit()
  const { problem } = useMessages()
  const schemaErrors = useSchemaErrors()
  const fresh: PlanDraft = was === null ? { id: newId(), name: '', note: '', steps: [emptyStep(units)] } : draftOfSeasonPlan(was)
  const draft = reactive<PlanDraft>(copyOf(fresh))
  const merge = was === null ? null : useMerge<SeasonPlan, PlanDraft>({ draft: ref(draft), opened: was, schema: seasonPlanSchema, draftOf: draftOfSeasonPlan })
  const kept = useKeptForm<PlanDraft>(fresh, {
    // What was typed over another revision of the plan is not brought back.
    farmId: computed(() => session.farmId), kind: 'plan', about: () => (was === null ? 'new' : `${was.id}@${was.revision}`), fresh: () => fresh,
    isBegun: (typed) => JSON.stringify({ ...typed, id: '' }) !== JSON.stringify({ ...fresh, id: '' }),
  })
  let isTaking = false
  function take(): void {
    isTaking = true
    Object.assign(draft, copyOf(kept.content.value))
  }
  watch(draft, () => {
    if (!isTaking) kept.content.value = copyOf(draft)
    isTaking = false
  }, { deep: true })
  watch(kept.ready, () => { if (kept.resumed.value) take() }, { immediate: true })
  const own = ref<Record<string, string>>({})
  const task = useTask((command: Parameters<typeof submit>[0]) => submit(command))
  const refused = computed(() => fieldErrors(task.error.value))
  const revisionSeen = (): number => merge?.revision.value ?? 1

  async function save(): Promise<'sent' | 'kept' | null> {
    if (task.running.value || merge?.isHeld.value === true) return null
    task.error.value = null
    const content = { name: draft.name, note: draft.note.trim() === '' ? null : draft.note, steps: draft.steps.map(stepBody) }
    const { id } = draft
    const body = was === null ? { id, ...content } : { revision: revisionSeen(), ...content }
    own.value = schemaErrors(was === null ? createPlanSchema : updatePlanSchema, body)
    if (Object.keys(own.value).length > 0) return null
    const state = (await task.run({ kind: was === null ? 'plan.create' : 'plan.update', farmId: session.farmId, id, body } as Parameters<typeof submit>[0]))?.state ?? null
    if (state !== null) await kept.discard()
    else if (merge?.meet(task.error.value) === true) task.error.value = null
    return state
  }
  const act = async (command: Parameters<typeof submit>[0]): Promise<boolean> => (await task.run(command)) !== undefined

  return {
    draft, busy: task.running, merge, save, ready: kept.ready, resumed: kept.resumed,
    beginAnew: async () => {
      await kept.discard()
      take()
    },
    errors: computed(() => ({ ...refused.value, ...own.value })),
    refusal: computed(() => (task.error.value === null || Object.keys(refused.value).length > 0 ? '' : problem(task.error.value))),
    addStep: () => { draft.steps.push({ ...emptyStep(units), blockIds: [...(draft.steps.at(-1)?.blockIds ?? [])] }) },
    removeStep: (index) => { draft.steps.splice(index, 1) },
    end: (reason) => act({ kind: 'plan.end', farmId: session.farmId, id: fresh.id, body: { revision: revisionSeen(), reason } }),
    reopen: () => act({ kind: 'plan.reopen', farmId: session.farmId, id: fresh.id, body: { revision: revisionSeen() } }),
  }
}

function stepBody(step: StepDraft): object {
  const { kind, value, unit, each, reading, materialId } = step.component
  const figure = numberOf(value)
  const basis = kind === 'ratio' ? { kind, parts: figure, reading } : kind === 'perEach' ? { kind, value: figure, unit, each } : { kind, value: figure, unit }
  return {
    id: step.id, method: step.method, materialId, basis, water: waterBody(step), blockIds: step.blockIds, everyDays: wholeOf(step.everyDays),
    firstOn: step.firstOn ?? '', lastOn: step.lastOn ?? '', earlyDays: wholeOf(step.earlyDays), lateDays: wholeOf(step.lateDays),
  }
}

function waterBody({ method, water }: StepDraft): object | null {
  if (water.sizedFrom === '' || method === 'solid') return null
  const source = water.source.trim() === '' ? null : water.source
  if (water.sizedFrom === 'none') return { sizedFrom: 'none' }
  const typed = { sizedFrom: water.sizedFrom, value: numberOf(water.value), unit: water.unit, source }
  return water.sizedFrom === 'perEach' ? { ...typed, each: water.each } : typed
}

/** The whole number of a text, below 0 too, or what stands there: the contract says what is wrong with it. */
function wholeOf(text: string): number | string {
  const read = numberOf(text)
  if (read !== '') return Number(read)
  return /^\s*-\d+\s*$/.test(text) ? Number(text) : text
}
