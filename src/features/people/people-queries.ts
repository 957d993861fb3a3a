import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query'
import type { z } from 'zod'
import { doneSchema } from '../../../shared/auth/auth-schemas.ts'
import type { addLeaveSchema } from '../../../shared/people/leave-schemas.ts'
import {
  type createPersonSchema,
  type crewInputSchema,
  crewListSchema,
  type editPersonSchema,
  type moveCrewSchema,
  peopleListSchema,
  personSchema,
} from '../../../shared/people/people-schemas.ts'
import { api } from '../../lib/api-client.ts'

export const peopleQueries = {
  all: () => ['people'] as const,
  list: () =>
    queryOptions({
      queryKey: [...peopleQueries.all(), 'list'] as const,
      queryFn: ({ signal }) => api.get('/api/people', peopleListSchema, { signal }),
    }),
  crews: () =>
    queryOptions({
      queryKey: [...peopleQueries.all(), 'crews'] as const,
      queryFn: ({ signal }) => api.get('/api/crews', crewListSchema, { signal }),
    }),
}

function usePeopleMutation<Input>(mutationFn: (input: Input) => Promise<unknown>) {
  const client = useQueryClient()
  return useMutation({
    mutationFn,
    onSettled: () => client.invalidateQueries({ queryKey: peopleQueries.all() }),
  })
}

export const useAddPerson = () =>
  usePeopleMutation((input: z.input<typeof createPersonSchema>) =>
    api.post('/api/people', personSchema, input),
  )

export const useEditPerson = () =>
  usePeopleMutation(({ id, ...input }: z.input<typeof editPersonSchema> & { id: string }) =>
    api.patch(`/api/people/${id}`, personSchema, input),
  )

export const useInviteAgain = () =>
  usePeopleMutation((id: string) => api.post(`/api/people/${id}/invitation`, doneSchema))

export const useMoveCrew = () =>
  usePeopleMutation(({ id, ...input }: z.input<typeof moveCrewSchema> & { id: string }) =>
    api.put(`/api/people/${id}/crew`, personSchema, input),
  )

export const useAddLeave = () =>
  usePeopleMutation(({ id, ...input }: z.input<typeof addLeaveSchema> & { id: string }) =>
    api.post(`/api/people/${id}/leave`, personSchema, input),
  )

export const useDropLeave = () =>
  usePeopleMutation(({ id, leaveId }: { id: string; leaveId: string }) =>
    api.delete(`/api/people/${id}/leave/${leaveId}`, personSchema),
  )

export const useSaveCrew = () =>
  usePeopleMutation(({ id, ...input }: z.input<typeof crewInputSchema> & { id: string | null }) =>
    id ? api.put(`/api/crews/${id}`, doneSchema, input) : api.post('/api/crews', doneSchema, input),
  )
