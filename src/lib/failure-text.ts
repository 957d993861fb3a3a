import { ApiFailure } from './api-client.ts'

/** The message for a field of a failed call. */
export function issueAt(error: unknown, path: string): string | undefined {
  return error instanceof ApiFailure ? error.issueAt(path) : undefined
}

/** What to say beside the button: the failure's words, unless they already stand at fields shown. */
export function failureText(
  error: unknown,
  shownPaths: readonly string[] = [],
): string | undefined {
  if (!error) return undefined
  if (!(error instanceof ApiFailure)) return 'Something went wrong on this screen. Try again.'
  const elsewhere = error.error.issues.filter((issue) => !shownPaths.includes(issue.path))
  if (error.error.issues.length > 0 && elsewhere.length === 0) return undefined
  return elsewhere[0]?.message ?? error.message
}
