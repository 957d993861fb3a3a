import type { RoofForm } from './roof-form.ts'

type Branch = { [key: string]: unknown }

function isBranch(value: unknown): value is Branch {
  return value !== null && typeof value === 'object'
}

/** The text typed at a path of the form ('sections.rafter.depthMm', 'corners.2.x'); '' where there is none. */
export function textAt(form: RoofForm, path: string): string {
  let at: unknown = form
  for (const key of path.split('.')) at = isBranch(at) ? at[key] : undefined
  return typeof at === 'string' ? at : ''
}

/** The form with another text at a path; a path that the form does not have changes nothing. */
export function withText(form: RoofForm, path: string, text: string): RoofForm {
  return replaced(form, path.split('.'), text) as RoofForm
}

function replaced(at: unknown, [key, ...rest]: string[], text: string): unknown {
  if (key === undefined) return typeof at === 'string' ? text : at
  if (!isBranch(at) || !(key in at)) return at
  const next = replaced(at[key], rest, text)
  if (next === at[key]) return at
  return Array.isArray(at) ? at.with(Number(key), next) : { ...at, [key]: next }
}
