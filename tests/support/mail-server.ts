import { createServer, type Server, type Socket } from 'node:net'
import { type ParsedMail, simpleParser } from 'mailparser'
import { SMTPServer, type SMTPServerOptions } from 'smtp-server'

export interface MailServer {
  readonly url: string
  readonly received: ParsedMail[]
  /** What each next receiver is answered, first first; nothing queued: taken. */
  readonly answers: number[]
  readonly close: () => Promise<void>
}

/** A real SMTP server on a free port; it takes what it is sent unless told to answer otherwise. */
export async function aMailServer(options: SMTPServerOptions = {}): Promise<MailServer> {
  const received: ParsedMail[] = []
  const answers: number[] = []
  const server = new SMTPServer({
    authOptional: true,
    logger: false,
    onRcptTo: (_address, _session, done) => {
      const code = answers.shift()
      done(
        code === undefined
          ? null
          : Object.assign(new Error(code < 500 ? 'come back later' : 'no such person here'), { responseCode: code }),
      )
    },
    onData: (stream, _session, done) => {
      void simpleParser(stream).then((mail) => {
        received.push(mail)
        done()
      })
    },
    ...options,
  })
  // A line that breaks is the test's own doing.
  server.on('error', () => undefined)
  const port = await listening(server.listen(0, '127.0.0.1'))
  return {
    url: `smtp://127.0.0.1:${port}`,
    received,
    answers,
    close: () => new Promise((done) => server.close(() => done())),
  }
}

/** A machine that takes the line and never says a word. */
export async function aSilentServer(): Promise<Pick<MailServer, 'url' | 'close'>> {
  const lines = new Set<Socket>()
  const server = createServer((line) => lines.add(line))
  const port = await listening(server.listen(0, '127.0.0.1'))
  return {
    url: `smtp://127.0.0.1:${port}`,
    close: () => {
      for (const line of lines) line.destroy()
      return new Promise((done) => server.close(() => done()))
    },
  }
}

function listening(server: Pick<Server, 'address' | 'once'>): Promise<number> {
  return new Promise((done) => {
    server.once('listening', () => {
      const address = server.address()
      done(typeof address === 'object' && address !== null ? address.port : 0)
    })
  })
}
