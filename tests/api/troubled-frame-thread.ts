import { answerQuestions } from '../../server/lib/answer-questions.ts'
import { prepareRevision, type RevisionQuestion } from '../../server/revisions/prepare-revision.ts'
import { trouble } from './frame-trouble.ts'

/** The thread that ships, but for the plate widths of `trouble`. */
answerQuestions((question: RevisionQuestion) => {
  const { plateWidthMm } = question.form
  for (; plateWidthMm === trouble.endless;);
  if (plateWidthMm === trouble.dies) process.exit(3)
  if (plateWidthMm === trouble.throws) throw new Error('a line without an end')
  const hoard: number[][] = []
  while (plateWidthMm === trouble.eatsMemory) hoard.push(new Array<number>(1e6).fill(hoard.length))
  return prepareRevision(question)
})
