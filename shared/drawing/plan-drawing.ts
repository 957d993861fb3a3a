import type { FrameSpec, LineKind, Roof, RoofProblem } from '../roof/roof-types.ts'
import type { LengthUnits } from '../units/format-length.ts'
import type { DrawingPoint, Segment } from './drawing-geometry.ts'
import type { PaperWord } from './drawing-paper.ts'
import { overhangOutline, outlineMovedOut } from './overhang-outline.ts'
import { cornerBox, type PlanCorner, planCorners } from './plan-corners.ts'
import type { PlanDimension, PlanScaleBar } from './plan-dimensions.ts'
import { planDimensions, planScaleBar } from './plan-dimensions.ts'
import type { PlanLabel } from './plan-labels.ts'
import { placePlanLabels } from './plan-labels.ts'
import { isOnPlan, type PlanLayer } from './plan-layers.ts'
import type { PlanMember } from './plan-members.ts'
import { planMember } from './plan-members.ts'
import type { PlanProblem } from './plan-problems.ts'
import { planProblems } from './plan-problems.ts'
import type { DrawableRoof, PlanView } from './plan-view.ts'
import { posedMember } from './timber-pose.ts'
import { drawableRoof, planView } from './plan-view.ts'

export type PlanDrawingOptions = {
  widthPx: number
  maxHeightPx: number
  /** 'edit' numbers the corners and plates. */
  mode: 'edit' | 'read'
  units: LengthUnits
  problems: readonly RoofProblem[]
  /** Marks that must show where there is any room: the picked one, those due. */
  firstMarks: ReadonlySet<string>
  /** Put away, but for what is picked or due. */
  hiddenLayers?: ReadonlySet<PlanLayer>
}

/** A roof plan as shapes in px of its own width: what a screen or a page draws without thinking. */
export type PlanDrawing = {
  view: PlanView
  plateOuter: DrawingPoint[]
  plateInner: DrawingPoint[]
  tails: DrawingPoint[]
  roofLines: { kind: LineKind; segment: Segment }[]
  members: PlanMember[]
  labels: PlanLabel[]
  hiddenMarks: string[]
  dimensions: PlanDimension[]
  corners: PlanCorner[]
  scaleBar: PlanScaleBar
  problems: PlanProblem[]
  problemsElsewhere: RoofProblem[]
}

const noLayers: ReadonlySet<PlanLayer> = new Set()
const marginPx = { read: 40, edit: 46 }
const problemReachPx = 24

/** Null while fewer than two corners can be read. `spec` is null while the roof cannot be framed. */
export function planDrawing(
  roof: Roof,
  spec: FrameSpec | null,
  options: PlanDrawingOptions,
): PlanDrawing | null {
  const drawable = drawableRoof(roof)
  if (!drawable) return null
  const view = planView(drawable, { ...options, marginPx: marginPx[options.mode] })
  const members = (spec?.members ?? [])
    .filter((member) => isOnPlan(member, options.hiddenLayers ?? noLayers, options.firstMarks))
    .map((member) => planMember(spec ? posedMember(spec, member) : member, view))
  const problems = planProblems(options.problems, drawable, view)
  const corners = options.mode === 'edit' ? planCorners(drawable, view) : []
  const dimensions = planDimensions(drawable, view, corners, options.units)
  const marks = placePlanLabels(members, spec?.cutLines ?? [], {
    widthPx: view.widthPx,
    heightPx: view.heightPx,
    firstMarks: options.firstMarks,
    taken: takenBoxes(dimensions, corners, problems.drawn),
  })
  return {
    view,
    ...plateShapes(roof, drawable, view),
    roofLines: roofLines(spec, view),
    members,
    labels: marks.labels,
    hiddenMarks: marks.hiddenMarks,
    dimensions,
    corners,
    scaleBar: planScaleBar(view),
    problems: problems.drawn,
    problemsElsewhere: problems.elsewhere,
  }
}

function plateShapes(roof: Roof, drawable: DrawableRoof, view: PlanView) {
  const plateMm = Number.isFinite(roof.plateWidthMm) ? Math.max(0, roof.plateWidthMm) : 0
  return {
    plateOuter: drawable.outline.map(view.place),
    plateInner: outlineMovedOut(drawable.outline, () => -plateMm).map(view.place),
    tails: overhangOutline(drawable).map(view.place),
  }
}

/** Ridges, hips, valleys and broken hips; plates and tails are drawn from the outline. */
function roofLines(spec: FrameSpec | null, view: PlanView): PlanDrawing['roofLines'] {
  return (spec?.lines ?? [])
    .filter((line) => line.kind !== 'eave' && line.kind !== 'verge')
    .map((line) => ({
      kind: line.kind,
      segment: { from: view.place(line.from), to: view.place(line.to) },
    }))
}

function takenBoxes(
  dimensions: readonly PlanDimension[],
  corners: readonly PlanCorner[],
  problems: readonly PlanProblem[],
): PaperWord[] {
  const square = (centre: DrawingPoint, sidePx: number): PaperWord => ({
    centre,
    widthPx: sidePx,
    heightPx: sidePx,
    angleDeg: 0,
    leader: null,
  })
  return [
    ...dimensions.flatMap((d) => (d.label ? [d.label] : [])),
    ...corners.map((corner) => ({ ...cornerBox(corner), leader: corner.leader })),
    ...problems.map((p) => square(p.at, problemReachPx)),
  ]
}
