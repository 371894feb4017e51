import type { ComponentProps } from 'react'

/**
 * A link that loads its page anew. Every link from an online page into the crew's shells (/bay, /pit-exit, /sign-on) must be one: a soft
 * navigation keeps the policy of the page before, which does not let the decoder run, and the camera would read nothing without an error.
 */
export function HardLink({ children, ...rest }: ComponentProps<'a'>) {
  return (
    <a data-slot="hard-link" {...rest}>
      {children}
    </a>
  )
}
