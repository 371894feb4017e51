import { Fragment } from 'react'
import type { InboxMail } from '@/lib/mail/queries/read-inbox'

/** The mails as they would have arrived; a link of ours can be followed, nothing else. */
export function InboxMails({ mails, origin }: { readonly mails: readonly InboxMail[]; readonly origin: string }) {
  return (
    <ul className="grid gap-3">
      {mails.map((mail) => (
        <li key={mail.id} className="min-w-0 border-t pt-3">
          <details>
            <summary className="target cursor-pointer wrap-anywhere">
              <span className="font-bold">{mail.subject}</span>
              <span className="block text-muted">
                to {mail.to}, {sentAt(mail.sentAt)}
              </span>
            </summary>
            <p className="mt-3 border-l-4 pl-4 wrap-anywhere whitespace-pre-wrap">
              <WithLinks text={mail.text} origin={origin} />
            </p>
          </details>
        </li>
      ))}
    </ul>
  )
}

function WithLinks({ text, origin }: { readonly text: string; readonly origin: string }) {
  return text.split(/(https?:\/\/\S+)/).map((part, index) => (
    <Fragment key={index}>
      {part.startsWith(`${origin}/`) ? (
        <a href={part} className="text-accent underline underline-offset-4">
          {part}
        </a>
      ) : (
        part
      )}
    </Fragment>
  ))
}

/** By the server's own clock: mail of several venues stands here. */
function sentAt(at: number): string {
  return new Intl.DateTimeFormat('en-GB', { dateStyle: 'medium', timeStyle: 'short', timeZone: 'UTC' }).format(at) + ' UTC'
}
