import Link from 'next/link'
import { buttonClass } from '@/app/_ui/button'
import { HardLink } from '@/app/_ui/hard-link'
import { PageFrame } from '@/app/_ui/page-frame'
import { PlainBar } from './_frame/plain-bar'

export default function HomePage() {
  return (
    <PageFrame title="Every check is a bolt, and a car runs only while its wire is whole" width="text" navigation={<PlainBar />}>
      <p className="max-w-prose">
        Lockwire keeps what the scrutineers of a track day saw: each car and each person, by whom, against which limit. The crew works with
        the network off; the pit exit knows who may leave.
      </p>
      <nav aria-label="Where to go" className="mt-8 flex flex-wrap gap-4">
        <Link className={buttonClass('primary')} href="/sign-in">
          Sign in
        </Link>
        <HardLink className={buttonClass('secondary')} href="/bay">
          Bay
        </HardLink>
        <HardLink className={buttonClass('secondary')} href="/sign-on">
          Sign-on
        </HardLink>
        <HardLink className={buttonClass('secondary')} href="/pit-exit">
          Pit exit
        </HardLink>
      </nav>
      <p className="mt-10 max-w-prose border-t pt-4 text-muted">
        A pass records what was seen that day without dismantling. It is no certificate and no warranty, and what could not be seen is
        listed. Local rules, the venue’s licence, road law and makers’ instructions stand above the lists kept here.
      </p>
    </PageFrame>
  )
}
