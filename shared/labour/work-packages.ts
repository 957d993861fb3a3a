import type { CutLine, FrameSpec, MemberRole } from '../roof/roof-types.ts'
import { centringCommons, firstPair, inOpposedPairs, marksOf } from './frame-order.ts'
import type { LabourRates } from './labour-rates.ts'
import type { PackageKey, WorkPackage, WorkStep } from './work-step.ts'

const roleWords: Record<MemberRole, string> = {
  ridge: 'ridge',
  common: 'common rafters',
  'crown-end': 'crown ends',
  hip: 'hips',
  'broken-hip': 'broken hips',
  valley: 'valleys',
  creeper: 'creepers',
  'valley-creeper': 'valley creepers',
  'cripple-creeper': 'cripple creepers',
  underpurlin: 'underpurlins',
  'collar-tie': 'collar ties',
  fascia: 'fascia',
  barge: 'barges',
}

/**
 * The roof's work in the order crews do it: set out the plates; cut one pair and try it, cut the commons;
 * stand the ridge on its centring pairs and brace it; crown ends; hips, valleys, broken hips; the other
 * commons; creepers in opposed pairs; purlins, struts, ties; fascia and tails to a line.
 *
 * Every member is cut in exactly one step and stood in exactly one later step.
 */
export function workPackagesOf(spec: FrameSpec, rates: LabourRates): WorkPackage[] {
  const steps = stepMaker(spec, rates)
  const pair = new Set(firstPair(spec))
  const centring = centringCommons(spec)
  const commons = marksOf(spec, 'common')
  const packages: Omit<WorkPackage, 'setUpMinutes'>[] = [
    { key: 'set-out-plates', title: 'Set out the plates', steps: [plateStep(spec, rates)] },
    {
      key: 'first-pair',
      title: 'Cut one pair and try it',
      steps: [...steps.cut('first-pair', pair), tryStep(rates, pair.size)],
    },
    {
      key: 'cut-commons',
      title: 'Cut the commons',
      steps: steps.cut('cut-commons', without(commons, pair)),
    },
    {
      key: 'ridge',
      title: 'Stand the ridge on its centring pairs and brace it',
      steps: ridgeSteps(spec, rates, steps, centring),
    },
    {
      key: 'crown-ends',
      title: 'Crown ends',
      steps: [
        ...steps.cut('crown-ends', without(marksOf(spec, 'crown-end'), pair)),
        ...steps.stand('crown-ends', marksOf(spec, 'crown-end')),
      ],
    },
    {
      key: 'hips',
      title: hipTitle(spec),
      steps: (['hip', 'valley', 'broken-hip'] as const).flatMap((role) =>
        steps.cutAndStand('hips', role),
      ),
    },
    {
      key: 'remaining-commons',
      title: 'Stand the other commons',
      steps: steps.stand('remaining-commons', without(commons, centring)),
    },
    {
      key: 'creepers',
      title: 'Creepers in opposed pairs',
      steps: (['creeper', 'valley-creeper', 'cripple-creeper'] as const).flatMap((role) =>
        steps.cutAndStand('creepers', role),
      ),
    },
    {
      key: 'purlins',
      title: 'Purlins, struts, ties',
      steps: (['underpurlin', 'collar-tie'] as const).flatMap((role) =>
        steps.cutAndStand('purlins', role),
      ),
    },
    {
      key: 'tails',
      title: 'Fascia and tails to a line',
      steps: [
        ...tailSteps(spec, rates),
        ...(['fascia', 'barge'] as const).flatMap((role) => steps.cutAndStand('tails', role)),
      ],
    },
  ]
  return packages
    .filter((p) => p.steps.length > 0)
    .map((p) => ({ ...p, setUpMinutes: rates.packageMinutes[p.key] }))
}

type StepMaker = {
  cut(key: PackageKey, marks: ReadonlySet<string>): WorkStep[]
  stand(key: PackageKey, marks: ReadonlySet<string>): WorkStep[]
  cutAndStand(key: PackageKey, role: MemberRole): WorkStep[]
}

function stepMaker(spec: FrameSpec, rates: LabourRates): StepMaker {
  const make =
    (work: 'cut' | 'stand') =>
    (key: PackageKey, marks: ReadonlySet<string>): WorkStep[] =>
      spec.cutLines.flatMap((line) => {
        const memberMarks = inOpposedPairs(
          spec,
          line.members.filter((mark) => marks.has(mark)),
        )
        if (memberMarks.length === 0) return []
        const { cutMinutes, standMinutes } = rates.pieces[line.role]
        return {
          packageKey: key,
          work,
          cutLineMark: line.mark,
          memberMarks,
          minutesEach: work === 'cut' ? cutMinutes : standMinutes,
          title: lineTitle(work, key, line),
        }
      })
  const [cut, stand] = [make('cut'), make('stand')]
  return {
    cut,
    stand,
    cutAndStand: (key, role) => {
      const marks = marksOf(spec, role)
      return [...cut(key, marks), ...stand(key, marks)]
    },
  }
}

function lineTitle(work: 'cut' | 'stand', key: PackageKey, line: CutLine): string {
  if (key === 'first-pair') return `Cut the first pair, ${line.mark}`
  if (key === 'ridge' && line.role === 'common') return `Stand the centring pairs, ${line.mark}`
  return `${work === 'cut' ? 'Cut' : 'Stand'} ${roleWords[line.role]} ${line.mark}`
}

function without(marks: ReadonlySet<string>, left: ReadonlySet<string>): Set<string> {
  return new Set([...marks].filter((mark) => !left.has(mark)))
}

function setOutStep(packageKey: PackageKey, title: string, minutes: number): WorkStep {
  return {
    packageKey,
    work: 'set-out',
    cutLineMark: null,
    memberMarks: [],
    minutesEach: Math.round(minutes),
    title,
  }
}

function plateStep(spec: FrameSpec, rates: LabourRates): WorkStep {
  const eaves = spec.lines.filter((l) => l.kind === 'eave')
  const plateM = eaves.reduce((sum, line) => sum + line.planLengthMm, 0) / 1000
  return setOutStep(
    'set-out-plates',
    'Check sides and diagonals, mark the rafters on the plates',
    rates.setOutMinutes + rates.setOutMinutesPerPlateM * plateM,
  )
}

function tryStep(rates: LabourRates, pieces: number): WorkStep {
  return setOutStep(
    'first-pair',
    pieces === 1 ? 'Try it on the plates' : 'Try the pair on the plates',
    rates.firstPairMinutes,
  )
}

function ridgeSteps(
  spec: FrameSpec,
  rates: LabourRates,
  steps: StepMaker,
  centring: ReadonlySet<string>,
): WorkStep[] {
  const ridges = marksOf(spec, 'ridge')
  if (ridges.size === 0) return []
  return [
    ...steps.cut('ridge', ridges),
    ...steps.stand('ridge', centring),
    ...steps.stand('ridge', ridges),
    setOutStep('ridge', 'Brace the ridge', rates.braceRidgeMinutes * ridges.size),
  ]
}

function tailSteps(spec: FrameSpec, rates: LabourRates): WorkStep[] {
  const minutes = (rates.tailLineMinutesPerEaveM * spec.totals.eaveMm) / 1000
  return minutes > 0 ? [setOutStep('tails', 'Bring tails and fascia to a line', minutes)] : []
}

function hipTitle(spec: FrameSpec): string {
  const parts = (['hip', 'valley', 'broken-hip'] as const)
    .filter((role) => spec.members.some((m) => m.role === role))
    .map((role) => roleWords[role])
  const words = parts.join(', ')
  return words.charAt(0).toUpperCase() + words.slice(1)
}
