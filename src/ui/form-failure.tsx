import { failureText } from '../lib/failure-text.ts'

/** What went wrong with a form as a whole; faults that stand at their fields are not said twice. */
export function FormFailure({
  error,
  shownPaths = [],
}: {
  error: unknown
  shownPaths?: readonly string[]
}) {
  const text = failureText(error, shownPaths)
  return text ? (
    <p role="alert" className="font-semibold text-stop">
      {text}
    </p>
  ) : null
}
