import type {
  LineKind,
  Member,
  RoofLine,
  RoofPlane,
  RoofTotals,
  SectionTotal,
} from './roof-types.ts'

const lineTotal = (lines: RoofLine[], ...kinds: LineKind[]): number =>
  lines.reduce((sum, line) => sum + (kinds.includes(line.kind) ? line.trueLengthMm : 0), 0)

const bySection = (members: Member[]): SectionTotal[] => {
  const totals: SectionTotal[] = []
  for (const { section, cutLengthMm, weightKg } of members) {
    let total = totals.find(
      (t) => t.section.thicknessMm === section.thicknessMm && t.section.depthMm === section.depthMm,
    )
    if (total === undefined) {
      total = { section: { ...section }, pieces: 0, lengthMm: 0, weightKg: 0 }
      totals.push(total)
    }
    total.pieces += 1
    total.lengthMm += cutLengthMm
    total.weightKg += weightKg
  }
  return totals.sort(
    (a, b) =>
      b.section.depthMm - a.section.depthMm || b.section.thicknessMm - a.section.thicknessMm,
  )
}

/** Areas, line lengths (set-out, true) and timber by section. */
export const roofTotals = (
  planes: RoofPlane[],
  lines: RoofLine[],
  members: Member[],
): RoofTotals => ({
  roofAreaM2: planes.reduce((sum, plane) => sum + plane.areaM2, 0),
  roofAreaWithEavesM2: planes.reduce((sum, plane) => sum + plane.areaWithEavesM2, 0),
  ridgeMm: lineTotal(lines, 'ridge'),
  hipMm: lineTotal(lines, 'hip', 'broken-hip'),
  valleyMm: lineTotal(lines, 'valley'),
  eaveMm: lineTotal(lines, 'eave'),
  vergeMm: lineTotal(lines, 'verge'),
  bySection: bySection(members),
})
