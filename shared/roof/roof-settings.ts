import type { RoofSettings } from './roof-types.ts'

/** Defaults of roof.md; a firm changes them in its settings. */
export const defaultSettings: RoofSettings = {
  sawMaxTiltDeg: 50,
  minCreeperMm: 300,
  longestStockMm: 6000,
  densityKgM3: 550,
  roundMm: 1,
  roundDeg: 0.5,
  maxRafterSpanMm: 3600,
  covering: null,
  collarTieSpacingMm: 1200,
}

/** Goes up whenever the same input would give other numbers; a revision stores it. */
export const engineVersion = '4'
