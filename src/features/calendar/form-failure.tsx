import { ApiFailure } from '../../lib/api-client.ts'

const ownFields = ['jobId', 'crewId', 'startsOn', 'workingDays', 'state', 'startAt', 'gear']

/** What went wrong that no field of the form says itself. */
export function FormFailure({ error }: { error: unknown }) {
  if (!(error instanceof ApiFailure)) return null
  const elsewhere = error.error.issues.filter((issue) => !ownFields.includes(issue.path))
  if (error.error.issues.length > 0 && elsewhere.length === 0) return null
  return (
    <p role="alert" className="font-semibold text-stop">
      {elsewhere[0]?.message ?? error.message}
    </p>
  )
}

export function issuesOf(error: unknown): (path: string) => string | undefined {
  return (path) => (error instanceof ApiFailure ? error.issueAt(path) : undefined)
}
