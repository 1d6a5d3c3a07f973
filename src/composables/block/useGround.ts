import type { UseQueryReturnType } from '@tanstack/vue-query'
import type { MaybeRefOrGetter } from 'vue'
import type { GroundFeature, Site } from '../../../shared/contract/ground.ts'
import { groundApi } from '../../api/groundApi.ts'
import { useFarmRead } from '../farm/useFarmRead.ts'

/** The farm's own ground plan, what ended too. */
export function useGround(farmId: MaybeRefOrGetter<string>): UseQueryReturnType<GroundFeature[], Error> {
  return useFarmRead('ground', farmId, (id) => groundApi.ground(id))
}

/** Sites to keep clear of, those that ended too. */
export function useSites(farmId: MaybeRefOrGetter<string>): UseQueryReturnType<Site[], Error> {
  return useFarmRead('sites', farmId, (id) => groundApi.sites(id))
}
