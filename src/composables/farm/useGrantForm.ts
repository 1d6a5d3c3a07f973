import { computed, ref, type ComputedRef, type Ref } from 'vue'
import { useI18n } from 'vue-i18n'
import { changeGrantSchema, giveGrantSchema, type Grant } from '../../../shared/contract/grant.ts'
import { ApiError } from '../../api/errors.ts'
import { useSession } from '../../stores/session.ts'
import { fieldErrors } from '../form/fieldErrors.ts'
import { newId } from '../form/newId.ts'
import { useMessages } from '../app/useMessages.ts'
import { useSchemaErrors } from '../form/useSchemaErrors.ts'
import { useSubmit } from '../form/useSubmit.ts'
import { useTask } from '../form/useTask.ts'

/** What is typed to give or change a grant. */
export interface GrantDraft { certifierEmail: string; organisation: string; seasons: number[]; endsOn: string | null; password: string }

export interface GrantForm {
  draft: Ref<GrantDraft>
  busy: Ref<boolean>
  errors: ComputedRef<Record<string, string>>
  /** What stands against the whole of it. */
  failure: ComputedRef<string>
  /** An empty form, or that of a grant to change. */
  begin: (grant: Grant | null, suggested: Pick<GrantDraft, 'seasons' | 'endsOn'>) => void
  /** The grant as it is now; undefined when it was refused. */
  save: () => Promise<Grant | undefined>
  end: (grant: Grant) => Promise<Grant | undefined>
}

const EMPTY: GrantDraft = { certifierEmail: '', organisation: '', seasons: [], endsOn: null, password: '' }

/** Giving, changing and ending a grant; each asks the password, so nothing of it is kept on the device. */
export function useGrantForm(): GrantForm {
  const { t } = useI18n()
  const session = useSession()
  const { submit } = useSubmit()
  const { problem } = useMessages()
  const schemaErrors = useSchemaErrors()
  const draft = ref<GrantDraft>({ ...EMPTY })
  const found = ref<Record<string, string>>({})
  let id = newId()
  let changed: Grant | null = null

  const task = useTask(async (kind: 'grant.give' | 'grant.change' | 'grant.end', grant: Grant | null) => {
    const farmId = session.farmId
    const { certifierEmail, organisation, seasons, endsOn, password } = draft.value
    const sent = kind === 'grant.give' ? submit({ kind, farmId, id, body: { id, certifierEmail, organisation, seasons, endsOn: endsOn ?? '', password } })
      : kind === 'grant.change' ? submit({ kind, farmId, id: grant?.id ?? '', body: { revision: grant?.revision ?? 0, organisation, seasons, endsOn: endsOn ?? '', password } })
        : submit({ kind, farmId, id: grant?.id ?? '', body: { revision: grant?.revision ?? 0, password } })
    const done = await sent
    return done.state === 'sent' ? done.answer : undefined
  })

  function begin(grant: Grant | null, suggested: Pick<GrantDraft, 'seasons' | 'endsOn'>): void {
    id = newId()
    changed = grant
    draft.value = grant === null ? { ...EMPTY, ...suggested } : { certifierEmail: grant.email, organisation: grant.organisation, seasons: [...grant.seasons], endsOn: grant.endsOn, password: '' }
    found.value = {}
    task.error.value = null
  }

  async function save(): Promise<Grant | undefined> {
    if (task.running.value) return undefined
    const { certifierEmail, ...rest } = draft.value
    const fits = { ...rest, endsOn: rest.endsOn ?? undefined }
    found.value = changed === null ? schemaErrors(giveGrantSchema, { ...fits, certifierEmail, id }) : schemaErrors(changeGrantSchema, { ...fits, revision: changed.revision })
    if (rest.endsOn === null) found.value = { ...found.value, endsOn: t('problems.field.required') }
    if (rest.password === '') found.value = { ...found.value, password: t('grants.form.needPassword') }
    if (Object.keys(found.value).length > 0) return undefined
    return changed === null ? task.run('grant.give', null) : task.run('grant.change', changed)
  }

  async function end(grant: Grant): Promise<Grant | undefined> {
    found.value = draft.value.password === '' ? { password: t('grants.form.needPassword') } : {}
    return Object.keys(found.value).length > 0 || task.running.value ? undefined : task.run('grant.end', grant)
  }

  const refused = computed(() => fieldErrors(task.error.value))
  return {
    draft, busy: task.running, begin, save, end,
    errors: computed(() => ({ ...refused.value, ...found.value })),
    failure: computed(() => {
      const error = task.error.value
      if (error === null || Object.keys(refused.value).length > 0) return ''
      return error instanceof ApiError && error.problem.code === 'stale' ? t('grants.stale') : problem(error)
    }),
  }
}
