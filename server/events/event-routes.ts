import type { Api } from '../http/api.ts'
import type { EventHub } from './event-hub.ts'

const heartbeatMs = 25_000

/** Server-sent events; the browser reconnects by itself. */
export function eventRoutes(api: Api, hub: EventHub): void {
  api.route('get', '/api/events', 'event:read', (req, res) => {
    res.writeHead(200, {
      'Content-Type': 'text/event-stream',
      'Cache-Control': 'no-store',
      Connection: 'keep-alive',
      'X-Accel-Buffering': 'no',
    })
    res.write('retry: 2000\n\n')
    const unsubscribe = hub.subscribe((event) => res.write(`data: ${JSON.stringify(event)}\n\n`))
    const heartbeat = setInterval(() => res.write(': still here\n\n'), heartbeatMs)
    req.on('close', () => {
      clearInterval(heartbeat)
      unsubscribe()
    })
  })
}
