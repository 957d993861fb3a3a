import type { z } from 'zod'
import { doneSchema } from '../../../shared/auth/auth-schemas.ts'
import type { addLeaveSchema } from '../../../shared/people/leave-schemas.ts'
import {
  type addLoanSchema,
  loanSchema,
  type moveCrewSchema,
  personSchema,
} from '../../../shared/people/people-schemas.ts'
import { api } from '../../lib/api-client.ts'
import { usePeopleMutation } from './people-queries.ts'

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

export const useAddLoan = () =>
  usePeopleMutation(({ id, ...input }: z.input<typeof addLoanSchema> & { id: string }) =>
    api.post(`/api/people/${id}/loans`, loanSchema, input),
  )

export const useDropLoan = () =>
  usePeopleMutation(({ id, loanId }: { id: string; loanId: string }) =>
    api.delete(`/api/people/${id}/loans/${loanId}`, doneSchema),
  )
