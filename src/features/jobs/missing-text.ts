import { type JobMissing, jobMissingWords } from '../../../shared/jobs/job-missing.ts'

/** 'No price, not booked'. */
export function missingText(missing: readonly JobMissing[]): string {
  const words = missing.map((kind) => jobMissingWords[kind])
  return words
    .map((text, i) => (i === 0 ? text : text.charAt(0).toLowerCase() + text.slice(1)))
    .join(', ')
}
