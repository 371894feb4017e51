import { Notice } from '@/app/_ui/notice'

interface ProblemNoticeProps {
  readonly problem: { readonly what: string; readonly kept: string; readonly todo: string } | null
  readonly className?: string
}

/** A problem in its three sentences; nothing where there is none. */
export function ProblemNotice({ problem, className = '' }: ProblemNoticeProps) {
  if (!problem) return null
  return <Notice happened={problem.what} kept={problem.kept} todo={problem.todo} className={className} />
}
