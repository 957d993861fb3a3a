import type { FrameSpec, Roof, RoofSettings } from '../../../shared/roof/roof-types.ts'

export type FrameQuestion = { id: number; roof: Roof; settings: RoofSettings }
export type FrameAnswer =
  { id: number; spec: FrameSpec; message: null } | { id: number; spec: null; message: string }
