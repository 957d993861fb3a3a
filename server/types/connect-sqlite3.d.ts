declare module 'connect-sqlite3' {
  import type session from 'express-session'
  type Options = { dir?: string; db?: string; table?: string; concurrentDB?: string }
  export default function connect(module: typeof session): new (options: Options) => session.Store
}
