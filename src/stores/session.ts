import { defineStore } from 'pinia'
import { computed, ref, shallowRef } from 'vue'
import type { Membership, Role, Session } from '../../shared/contract/session.ts'
import { ApiError, NetworkError } from '../api/errors.ts'
import { sessionApi } from '../api/sessionApi.ts'
import { queryClient } from '../plugins/queryClient.ts'
import { forgetReads, keptSession, keepSession } from './reads.ts'
import { readSetting, writeSetting } from './settings.ts'

/** Who is signed in, on which farms, and which farm is open. */
export const useSession = defineStore('session', () => {
  const session = shallowRef<Session | null>(null)
  const loaded = ref(false)
  const chosenFarmId = ref(readSetting('farm'))

  const user = computed(() => session.value?.user ?? null)
  const memberships = computed<Membership[]>(() => session.value?.memberships ?? [])
  const membership = computed<Membership | null>(
    () => memberships.value.find((each) => each.farmId === chosenFarmId.value) ?? memberships.value[0] ?? null,
  )
  /** Empty while no farm is open. */
  const farmId = computed(() => membership.value?.farmId ?? '')
  const role = computed<Role | null>(() => membership.value?.role ?? null)
  /** May add blocks, inputs and sprayers. */
  const canManage = computed(() => role.value === 'owner' || role.value === 'manager')
  /** Works on the farm: no outsider. */
  const isOfFarm = computed(() => role.value !== null && role.value !== 'certifier')
  /** May write records. */
  const canRecord = isOfFarm

  /** Asks once who is signed in; without signal, whoever was last. */
  async function load(): Promise<void> {
    if (loaded.value) return
    try {
      accept(await sessionApi.read())
    } catch (error) {
      if (error instanceof NetworkError) session.value = await keptSession()
      else if (!(error instanceof ApiError)) throw error
    }
    loaded.value = true
  }

  /** @param code of the second factor, where the account has one. */
  async function signIn(email: string, password: string, code?: string): Promise<void> {
    enter(await sessionApi.signIn(email, password, code))
  }

  /** On a phone of the farm. */
  async function signInByPin(personId: string, pin: string): Promise<void> {
    enter(await sessionApi.signInByPin(personId, pin))
  }

  function enter(answer: Session): void {
    if (user.value !== null && user.value.id !== answer.user.id) queryClient.clear()
    accept(answer)
  }

  /** Leaves: what the server gave is wiped, drafts and kept commands stay for their account. */
  async function signOut(): Promise<void> {
    await sessionApi.signOut()
    await forget()
  }

  /** Nobody is signed in any more: the session ended on the server. */
  async function forget(): Promise<void> {
    session.value = null
    queryClient.clear()
    await forgetReads()
  }

  /** A session made elsewhere: a welcome link accepted. */
  function accept(answer: Session): void {
    session.value = answer
    loaded.value = true
    void keepSession(answer)
  }

  /** What the account says of itself now: changed on one's own page. */
  function acceptUser(changed: Session['user']): void {
    if (session.value !== null) accept({ ...session.value, user: changed })
  }

  /** Reads again who is signed in and what is open to them. */
  async function reload(): Promise<void> {
    accept(await sessionApi.read())
  }

  /** Reads the memberships again and opens one of them: a farm just made. */
  async function open(id: string): Promise<void> {
    accept(await sessionApi.read())
    chooseFarm(id)
  }

  function chooseFarm(id: string): void {
    chosenFarmId.value = id
    writeSetting('farm', id)
  }

  return {
    session, loaded, user, memberships, membership, farmId, role, canManage, isOfFarm, canRecord,
    load, signIn, signInByPin, acceptUser, reload, signOut, forget, accept, open, chooseFarm,
  }
})
