import type { FrameSpec, MemberRole } from '../roof/roof-types.ts'
import type { FormProblem } from './form-typing.ts'
import type { RoofForm } from './roof-form.ts'
import { isEmptySection } from './roof-of-form.ts'

const rolesOf = {
  hip: ['hip', 'broken-hip'],
  valley: ['valley'],
} satisfies Record<string, MemberRole[]>

/**
 * Hips and valleys of a framed roof that nobody typed a size for. Those that start at a corner are asked
 * for before; a wing wider than its main building has broken hips that no corner tells of.
 */
export function unsizedProblems(form: RoofForm, { members }: Pick<FrameSpec, 'members'>) {
  return (['hip', 'valley'] as const).flatMap((key): FormProblem[] => {
    if (!isEmptySection(form.sections[key])) return []
    const roles: MemberRole[] = rolesOf[key]
    if (!members.some((member) => roles.includes(member.role))) return []
    return (['depthMm', 'thicknessMm'] as const).map((side) => ({
      path: `sections.${key}.${side}`,
      message: `Type the ${side === 'depthMm' ? 'depth' : 'thickness'} of the ${key}.`,
      isMissing: true,
    }))
  })
}
