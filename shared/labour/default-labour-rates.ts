import type { LabourRates } from './labour-rates.ts'

/**
 * Where a firm starts until its own day logs say better.
 *
 * Minutes a piece are common practice, no source; together they are held against the estimating textbook's
 * 9.3–14.8 h per m³ for hip roofs and 7.8–12.7 h per m³ for gable rafters (figure 13.55, excerpt seen, title
 * not; converted) by a test on reference roofs.
 */
export const defaultLabourRates: LabourRates = {
  pieces: {
    ridge: { cutMinutes: 12, standMinutes: 30 },
    common: { cutMinutes: 7, standMinutes: 9 },
    'crown-end': { cutMinutes: 9, standMinutes: 10 },
    hip: { cutMinutes: 20, standMinutes: 25 },
    'broken-hip': { cutMinutes: 20, standMinutes: 20 },
    valley: { cutMinutes: 22, standMinutes: 25 },
    creeper: { cutMinutes: 8, standMinutes: 8 },
    'valley-creeper': { cutMinutes: 8, standMinutes: 8 },
    'cripple-creeper': { cutMinutes: 9, standMinutes: 8 },
  },
  setOutMinutes: 30,
  setOutMinutesPerPlateM: 2,
  firstPairMinutes: 20,
  braceRidgeMinutes: 25,
  tailLineMinutesPerEaveM: 4,
}
