export { frameRoof } from '../../shared/roof/frame-roof.ts'
export { plateLines } from '../../shared/roof/plate-lines.ts'
export { roofLines } from '../../shared/roof/roof-lines.ts'
export { roofProblems } from '../../shared/roof/roof-problems.ts'
