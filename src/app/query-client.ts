import { QueryCache, QueryClient } from '@tanstack/react-query'
import { ApiProblem, NoNetwork } from '../api.ts'
import { meKey } from '../people/people.api.ts'

/**
 * The cache of what can be fetched again. `offlineFirst`: a query asks once even when the device thinks it has no
 * network, and answers from what lies on the device.
 */
export const queryClient: QueryClient = new QueryClient({
  queryCache: new QueryCache({
    // Refused because nobody is signed in, or not as who we thought: the page must know at once.
    onError: (problem) => {
      if (problem instanceof ApiProblem && (problem.status === 401 || problem.status === 403))
        void queryClient.invalidateQueries({ queryKey: meKey })
    },
  }),
  defaultOptions: {
    queries: {
      networkMode: 'offlineFirst',
      gcTime: Infinity,
      retry: (failures, problem) =>
        failures < 2 &&
        !(problem instanceof NoNetwork) &&
        !(problem instanceof ApiProblem && problem.status < 500),
    },
  },
})
