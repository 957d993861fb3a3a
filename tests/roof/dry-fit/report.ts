/** One thing that the dry fit complains of: which check, which pieces, how far out. */
export type Complaint = {
  check:
    | 'surface'
    | 'numbers'
    | 'cut plane'
    | 'long and short points'
    | 'place'
    | 'overlap'
    | 'joint'
    | 'top edge'
    | 'planing'
    | 'seat'
    | 'layout'
    | 'beside'
    | 'rounding'
  marks: string[]
  /** How far out, in millimetres (degrees or cubic millimetres where the text says so). */
  out: number
  text: string
}

export type Complain = (complaint: Complaint) => void

export function collector(): { complain: Complain; complaints: Complaint[] } {
  const complaints: Complaint[] = []
  return { complaints, complain: (complaint) => complaints.push(complaint) }
}

/** Readable lines, worst of each kind first, so that a failing test says what to look at. */
export function reportLines(complaints: readonly Complaint[], most = 40): string[] {
  const sorted = [...complaints].sort(
    (a, b) => a.check.localeCompare(b.check) || Math.abs(b.out) - Math.abs(a.out),
  )
  const lines = sorted
    .slice(0, most)
    .map((c) => `${c.check}: ${c.marks.join(' / ')}: ${c.text} (${c.out.toFixed(3)})`)
  const left = complaints.length - most
  return left > 0 ? [...lines, `… and ${left} more`] : lines
}
