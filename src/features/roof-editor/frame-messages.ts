import type { FormFrame } from '../../../shared/revisions/frame-of-form.ts'
import type { RoofForm } from '../../../shared/revisions/roof-form.ts'
import type { FormFirm } from '../../../shared/revisions/roof-of-form.ts'

export type FrameQuestion = { id: number; form: RoofForm; firm: FormFirm }
/** `frame` is null where the engine broke down over the roof: a fault of ours, not of what was typed. */
export type FrameAnswer = { id: number; frame: FormFrame | null }
