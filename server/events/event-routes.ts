import type { Request } from 'express'
import type { Api } from '../http/api.ts'
import type { EventHub } from './event-hub.ts'

const heartbeatMs = 25_000

/**
 * Server-sent events; the browser reconnects by itself. Before each word the session is looked at again: an
 * ended one hears nothing more, and its stream is closed.
 */
export function eventRoutes(
  api: Api,
  hub: EventHub,
  isStillSignedIn: (req: Request) => Promise<boolean>,
): void {
  api.route('get', '/api/events', 'event:read', (req, res) => {
    res.writeHead(200, {
      'Content-Type': 'text/event-stream',
      'Cache-Control': 'no-store',
      Connection: 'keep-alive',
      'X-Accel-Buffering': 'no',
    })
    res.write('retry: 2000\n\n')
    const say = (text: string): void => {
      isStillSignedIn(req).then(
        (holds) => (holds ? res.write(text) : res.end()),
        () => res.end(),
      )
    }
    const unsubscribe = hub.subscribe((event) => say(`data: ${JSON.stringify(event)}\n\n`))
    const heartbeat = setInterval(() => say(': still here\n\n'), heartbeatMs)
    res.on('close', () => {
      clearInterval(heartbeat)
      unsubscribe()
    })
  })
}
