import fc from 'fast-check'

/** Random tests draw the same each time, so that a fault found stays found; `SEED=<number>` draws others. */
fc.configureGlobal({ seed: Number(process.env['SEED'] ?? 20_261_201) })
