import { QueryClient } from '@tanstack/react-query'
import { ApiProblem, NoNetwork } from '../api.ts'

/**
 * The cache of what can be fetched again. `offlineFirst`: a query asks once even when the device thinks it has no
 * network, and answers from what lies on the device.
 */
export const queryClient = new QueryClient({
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
