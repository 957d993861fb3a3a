import {
  notYetToldSchema,
  tellThemSchema,
  toldThemSchema,
} from '../../shared/notices/notice-schemas.ts'
import { currentUser } from '../auth/current-user.ts'
import { type Api, send } from '../http/api.ts'
import { parseInput } from '../http/parse-input.ts'
import { createNoticeService, type NoticeDeps } from './notice-service.ts'

export function noticeRoutes(api: Api, deps: NoticeDeps): void {
  const notices = createNoticeService(deps)

  api.route('get', '/api/notices', 'notice:read', (_req, res) => {
    send(res, notYetToldSchema, notices.read())
  })

  api.route('post', '/api/notices', 'notice:write', (req, res) => {
    const mails = notices.tell(currentUser(res), parseInput(tellThemSchema, req.body))
    send(res, toldThemSchema, { mails }, 202)
  })
}
