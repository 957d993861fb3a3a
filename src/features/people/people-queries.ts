import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query'
import type { z } from 'zod'
import { doneSchema } from '../../../shared/auth/auth-schemas.ts'
import {
  type createPersonSchema,
  type crewInputSchema,
  crewListSchema,
  crewPeopleSchema,
  type editPersonSchema,
  peopleListSchema,
  personDetailSchema,
  type personHoursSchema,
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
  person: (id: string) =>
    queryOptions({
      queryKey: [...peopleQueries.all(), 'person', id] as const,
      queryFn: ({ signal }) => api.get(`/api/people/${id}`, personDetailSchema, { signal }),
    }),
  crews: () =>
    queryOptions({
      queryKey: [...peopleQueries.all(), 'crews'] as const,
      queryFn: ({ signal }) => api.get('/api/crews', crewListSchema, { signal }),
    }),
  crewPeople: (id: string) =>
    queryOptions({
      queryKey: [...peopleQueries.all(), 'crew', id] as const,
      queryFn: ({ signal }) => api.get(`/api/crews/${id}/people`, crewPeopleSchema, { signal }),
    }),
}

export function usePeopleMutation<Input, Output>(mutationFn: (input: Input) => Promise<Output>) {
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

export const useSetHours = () =>
  usePeopleMutation(({ id, ...input }: z.input<typeof personHoursSchema> & { id: string }) =>
    api.put(`/api/people/${id}/hours`, personDetailSchema, input),
  )

export const useInviteAgain = () =>
  usePeopleMutation((id: string) => api.post(`/api/people/${id}/invitation`, doneSchema))

export const useSaveCrew = () =>
  usePeopleMutation(({ id, ...input }: z.input<typeof crewInputSchema> & { id: string | null }) =>
    id ? api.put(`/api/crews/${id}`, doneSchema, input) : api.post('/api/crews', doneSchema, input),
  )
