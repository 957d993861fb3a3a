import type { Request } from 'express'
import {
  listMessagesSchema,
  messageDetailSchema,
  messageListSchema,
  retryMessageSchema,
} from '../../shared/messages/message-schemas.ts'
import { currentUser } from '../auth/current-user.ts'
import { type Api, send } from '../http/api.ts'
import { parseInput } from '../http/parse-input.ts'
import { pathId } from '../http/path-id.ts'
import { createMessageService, type MessageDeps } from './message-service.ts'

const messageIdOf = (req: Request) => pathId(req, 'id', 'That message')

export function messageRoutes(api: Api, deps: MessageDeps): void {
  const messages = createMessageService(deps)

  api.route('get', '/api/messages', 'message:read', (req, res) => {
    send(res, messageListSchema, messages.list(parseInput(listMessagesSchema, req.query)))
  })

  api.route('get', '/api/messages/:id', 'message:read', (req, res) => {
    send(res, messageDetailSchema, messages.read(messageIdOf(req)))
  })

  api.route('post', '/api/messages/:id/retry', 'message:write', (req, res) => {
    const id = messageIdOf(req)
    parseInput(retryMessageSchema, req.body)
    send(res, messageDetailSchema, messages.retry(currentUser(res), id))
  })
}
