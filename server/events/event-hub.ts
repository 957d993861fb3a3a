import { EventEmitter } from 'node:events'
import type { LiveEvent } from '../../shared/events/live-event.ts'

/** In-process news of what changed; screens refetch what it names. */
export type EventHub = {
  publish(event: LiveEvent): void
  subscribe(listener: (event: LiveEvent) => void): () => void
}

export function createEventHub(): EventHub {
  const emitter = new EventEmitter()
  emitter.setMaxListeners(0)
  return {
    publish: (event) => void emitter.emit('event', event),
    subscribe(listener) {
      emitter.on('event', listener)
      return () => emitter.off('event', listener)
    },
  }
}
