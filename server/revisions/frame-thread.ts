import { answerQuestions } from '../lib/answer-questions.ts'
import { prepareRevision } from './prepare-revision.ts'

answerQuestions(prepareRevision)
