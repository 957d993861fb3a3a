import { benchDaySheet } from './bench-day-sheet.ts'
import { benchGrowth, benchReferences } from './bench-frames.ts'
import { loadLibrary } from './library-skeleton.ts'

console.log('Medians of one run on one machine: only their ratios say anything.')
const library = await loadLibrary()
benchReferences(library)
benchGrowth(library)
await benchDaySheet()
process.exit(0)
