import { useRouteError } from 'react-router-dom'
import { ApiFailure } from '../lib/api-client.ts'
import { Button } from '../ui/button.tsx'

/** The last resort of a screen: says what happened and offers a way on. */
export function RouteError() {
  const error = useRouteError()
  const failure = error instanceof ApiFailure ? error : null
  return (
    <section role="alert" className="mx-auto max-w-lg px-4 py-16 text-center">
      <h1 className="text-2xl font-extrabold">
        {failure?.status === 404 ? 'That is not here' : 'This page could not be shown'}
      </h1>
      <p className="mt-2 text-ink-soft">
        {failure ? failure.message : 'Something went wrong on this screen. What was saved is safe.'}
      </p>
      <div className="mt-6 flex justify-center gap-3">
        <Button onClick={() => window.location.reload()}>Try again</Button>
        <Button kind="plain" onClick={() => window.location.assign('/')}>
          Go to the start
        </Button>
      </div>
    </section>
  )
}
