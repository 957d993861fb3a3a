import { z } from 'zod'
import { idSchema } from '../../shared/http/fields.ts'
import {
  listMessagesSchema,
  messageDetailSchema,
  messageListSchema,
  retryMessageSchema,
} from '../../shared/messages/message-schemas.ts'
import { currentUser } from '../auth/current-user.ts'
import { type Api, send } from '../http/api.ts'
import { parseInput } from '../http/parse-input.ts'
import { createMessageService, type MessageDeps } from './message-service.ts'

const pathSchema = z.object({ id: idSchema })

export function messageRoutes(api: Api, deps: MessageDeps): void {
  const messages = createMessageService(deps)

  api.route('get', '/api/messages', 'message:read', (req, res) => {
    send(res, messageListSchema, messages.list(parseInput(listMessagesSchema, req.query)))
  })

  api.route('get', '/api/messages/:id', 'message:read', (req, res) => {
    send(res, messageDetailSchema, messages.read(parseInput(pathSchema, req.params).id))
  })

  api.route('post', '/api/messages/:id/retry', 'message:write', (req, res) => {
    const { id } = parseInput(pathSchema, req.params)
    parseInput(retryMessageSchema, req.body)
    send(res, messageDetailSchema, messages.retry(currentUser(res), id))
  })
}
