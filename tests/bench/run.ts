import { benchDaySheet } from './bench-day-sheet.ts'
import { benchFiveYears } from './bench-five-years.ts'
import { benchGrowth, benchReferences } from './bench-frames.ts'
import { benchKeystroke } from './bench-keystroke.ts'
import { builtEngine } from './built-engine.ts'
import { loadLibrary } from './library-skeleton.ts'

console.log('Medians of one run on one machine: only their ratios say anything.')
const rivals = { engine: await builtEngine(), library: await loadLibrary() }
benchReferences(rivals)
benchGrowth(rivals)
benchKeystroke(rivals.engine)
await benchDaySheet()
await benchFiveYears()
process.exit(0)
