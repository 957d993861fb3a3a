import type { z } from 'zod'
import { doneSchema } from '../../../shared/auth/auth-schemas.ts'
import {
  type addTicketSchema,
  type editTicketSchema,
  ticketSchema,
} from '../../../shared/people/ticket-schemas.ts'
import { api } from '../../lib/api-client.ts'
import { usePeopleMutation } from './people-queries.ts'

type Owned = { personId: string; ticketId: string }

const ticketPath = ({ personId, ticketId }: Owned) => `/api/people/${personId}/tickets/${ticketId}`
export const photoPath = (owned: Owned) => `${ticketPath(owned)}/photo`

export const useAddTicket = () =>
  usePeopleMutation(
    ({ personId, ...input }: z.input<typeof addTicketSchema> & { personId: string }) =>
      api.post(`/api/people/${personId}/tickets`, ticketSchema, input),
  )

export const useEditTicket = () =>
  usePeopleMutation(({ personId, ticketId, ...input }: z.input<typeof editTicketSchema> & Owned) =>
    api.put(ticketPath({ personId, ticketId }), ticketSchema, input),
  )

export const useDropTicket = () =>
  usePeopleMutation((owned: Owned) => api.delete(ticketPath(owned), doneSchema))

export const useSetPhoto = () =>
  usePeopleMutation(({ photo, ...owned }: Owned & { photo: File }) =>
    api.putPhoto(photoPath(owned), ticketSchema, photo),
  )

export const useDropPhoto = () =>
  usePeopleMutation((owned: Owned) => api.delete(photoPath(owned), ticketSchema))
