import { useQuery, type UseQueryReturnType } from '@tanstack/vue-query'
import { configApi, type ClientConfig } from '../api/configApi.ts'

/** What this server offers: ground tiles, the demo farm. */
export function useConfig(): UseQueryReturnType<ClientConfig, Error> {
  return useQuery({ queryKey: ['config'], staleTime: Infinity, queryFn: () => configApi.read() })
}
