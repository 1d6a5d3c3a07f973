import { useQuery, type UseQueryReturnType } from '@tanstack/vue-query'
import type { ClientConfig } from '../../../shared/contract/config.ts'
import { configApi } from '../../api/configApi.ts'

/** What this server offers: imagery, the demo farm. */
export function useConfig(): UseQueryReturnType<ClientConfig, Error> {
  return useQuery({ queryKey: ['config'], staleTime: Infinity, queryFn: () => configApi.read() })
}
