import { QueryCache, QueryClient, type Query } from '@tanstack/vue-query'
import { ApiError, NetworkError } from '../api/errors.ts'
import { isNotFound } from '../composables/app/isNotFound.ts'

/** What the server owns, kept while it is fresh. A refusal is never asked again by itself. */
export const queryClient = new QueryClient({
  queryCache: new QueryCache({ onError: (error, query) => { if (isNotFound(error)) forget(query) } }),
  defaultOptions: {
    queries: {
      staleTime: 30_000,
      // Without signal the read still runs: it answers from this device.
      networkMode: 'always',
      // What did not come for want of signal is asked for again when it is back.
      refetchOnReconnect: true,
      retry: (failures, error) => !(error instanceof ApiError) && !(error instanceof NetworkError) && failures < 1,
    },
  },
})

/**
 * What is not there any more, or not for this reader, does not stay on the screen because it was read before: neither it, nor what else of
 * its farm stands on the page, which is asked for again.
 */
function forget(query: Query<unknown, unknown>): void {
  query.setState({ data: undefined })
  const [, farm] = query.queryKey
  void queryClient.invalidateQueries({ predicate: ({ queryKey, state }) => queryKey[1] === farm && state.status === 'success' })
}
