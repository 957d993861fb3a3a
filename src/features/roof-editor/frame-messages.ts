import type { PlanDrawingOptions } from '../../../shared/drawing/plan-drawing.ts'
import type { SentPlan } from '../../../shared/drawing/sent-plan.ts'
import type { FormFrame } from '../../../shared/revisions/frame-of-form.ts'
import type { RoofForm } from '../../../shared/revisions/roof-form.ts'
import type { FormFirm } from '../../../shared/revisions/roof-of-form.ts'

/** Frame what is typed; or lay out the plan of the frame that had this number. */
export type FrameQuestion =
  | { kind: 'frame'; id: number; form: RoofForm; firm: FormFirm }
  | { kind: 'plan'; id: number; frameId: number; options: PlanDrawingOptions }

export type FrameAnswer =
  /** `frame` is null where the engine broke down over the roof: a fault of ours, not of what was typed. */
  | { kind: 'frame'; id: number; frame: FormFrame | null }
  /** `plan` is null where another roof has been framed since. */
  | { kind: 'plan'; id: number; plan: SentPlan | null }
