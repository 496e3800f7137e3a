import { type AddressInfo, createServer, type Server, type Socket } from 'node:net'

/** How the server behaves on one connection. */
export type Behaviour =
  | 'accept'
  /** 451 to the recipient: not now. */
  | 'later'
  /** 550 to the recipient. */
  | 'refuse'
  /** 554 once the whole mail is there. */
  | 'refuseContent'
  /** Never says a word. */
  | 'stall'
  /** Never answers the final dot. */
  | 'stallAfterDot'
  /** Gone while the mail is on its way. */
  | 'dropInTheMiddle'
  /** Has the whole mail and is gone before it says so. */
  | 'dropAfterDot'

export interface ScriptedMailServer {
  url: string
  /** What the next connections meet, in turn; after them every one is accepted. */
  script(...behaviours: Behaviour[]): void
  /** Mails that came whole, up to the final dot, answered or not. */
  received: string[]
  connections: number
  close(): Promise<void>
}

/** A mail server that speaks SMTP line by line, written for these tests alone, and misbehaves on demand. */
export async function startScriptedMailServer(port = 0): Promise<ScriptedMailServer> {
  const ahead: Behaviour[] = []
  const open = new Set<Socket>()
  const server = createServer((socket) => {
    open.add(socket)
    socket.on('close', () => open.delete(socket))
    socket.on('error', () => socket.destroy())
    mailServer.connections += 1
    converse(socket, ahead.shift() ?? 'accept', mailServer.received)
  })
  const mailServer: ScriptedMailServer = {
    url: '',
    script: (...behaviours) => ahead.push(...behaviours),
    received: [],
    connections: 0,
    close: () => end(server, open),
  }
  await new Promise<void>((resolve) => server.listen(port, '127.0.0.1', resolve))
  mailServer.url = `smtp://127.0.0.1:${(server.address() as AddressInfo).port}`
  return mailServer
}

function end(server: Server, open: Set<Socket>): Promise<void> {
  for (const socket of open) socket.destroy()
  return new Promise((resolve) => server.close(() => resolve()))
}

const dot = '\r\n.\r\n'

function converse(socket: Socket, behaviour: Behaviour, received: string[]): void {
  if (behaviour === 'stall') return
  let isMail = false
  let pending = ''
  const say = (line: string) => socket.write(`${line}\r\n`)
  say('220 scripted ready')
  socket.on('data', (bytes) => {
    pending += bytes.toString()
    if (isMail) {
      if (behaviour === 'dropInTheMiddle') return void socket.destroy()
      const at = pending.indexOf(dot)
      if (at < 0) return
      received.push(pending.slice(0, at))
      pending = pending.slice(at + dot.length)
      isMail = false
      if (behaviour === 'dropAfterDot') return void socket.destroy()
      if (behaviour === 'stallAfterDot') return
      say(behaviour === 'refuseContent' ? '554 not wanted here' : '250 taken')
    }
    for (let at = pending.indexOf('\r\n'); at >= 0 && !isMail; at = pending.indexOf('\r\n')) {
      const line = pending.slice(0, at).toUpperCase()
      pending = pending.slice(at + 2)
      if (line.startsWith('RCPT') && behaviour === 'later') say('451 mailbox busy, try again')
      else if (line.startsWith('RCPT') && behaviour === 'refuse') say('550 no such mailbox')
      else if (line === 'DATA') {
        isMail = true
        say('354 go on')
      } else if (line === 'QUIT') {
        say('221 bye')
        socket.end()
      } else say('250 fine')
    }
  })
}

/** The Message-ID of a mail as it came. */
export function messageIdOf(mail: string): string | undefined {
  return /^message-id:\s*(<[^>]+>)/im.exec(mail)?.[1]
}
