// A thread's first script: on Node 20 the TypeScript loader of the main thread does not reach into it.
import { workerData } from 'node:worker_threads'
import { register } from 'tsx/esm/api'

register()
await import(workerData.script)
