import { queryOptions } from '@tanstack/react-query'
import { EditionList } from '../../server/editions/editions.contract.ts'
import { get } from '../api.ts'

/** Every edition there has been, the newest first. */
export const editionsQuery = queryOptions({
  queryKey: ['edition', 'list'] as const,
  queryFn: ({ signal }) => get('/editions', EditionList, signal),
})
