import { QueryClient } from '@tanstack/vue-query'
import { ApiError, NetworkError } from '../api/errors.ts'

/** What the server owns, kept while it is fresh. A refusal is never asked again by itself. */
export const queryClient = new QueryClient({
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
