import { createServer, type IncomingMessage, type ServerResponse } from 'node:http';
import type { AddressInfo, Server } from 'node:net';
import { type ParsedMail, simpleParser } from 'mailparser';
import { SMTPServer } from 'smtp-server';
import { mailboxPage, mailPage } from './mailbox-pages.js';

export interface ReceivedMail {
  readonly number: number;
  readonly receivedAt: string;
  readonly from: string;
  readonly recipients: readonly string[];
  readonly subject: string;
  readonly messageId: string;
  readonly text: string;
  readonly html: string | null;
  readonly attachments: readonly { readonly fileName: string; readonly byteSize: number }[];
}

export interface RunningMailServer {
  readonly smtpUrl: string;
  /** A page that shows what came in; `/mails.json` has the same for programs. */
  readonly mailboxUrl: string;
  readonly mails: readonly ReceivedMail[];
  /** From now on every mail is refused with this answer; null accepts again. Also `PUT /refusal` with `{"code":451}` or `{"code":null}`. */
  refuseWith(code: number | null): void;
  stop(): Promise<void>;
}

/** How many mails are kept; older ones fall out, as a long demo must not fill the memory. */
const KEPT = 1000;

/** A mail server that delivers nothing and shows everything, on loopback. For the demo and for tests. */
export async function startMailServer(ports: { smtp?: number; mailbox?: number } = {}): Promise<RunningMailServer> {
  const mails: ReceivedMail[] = [];
  let received = 0;
  let refusal: number | null = null;
  const smtp = new SMTPServer({
    authOptional: true,
    disabledCommands: ['STARTTLS', 'AUTH'],
    onData(stream, session, callback) {
      simpleParser(stream).then(
        (parsed) => {
          if (refusal !== null) {
            return callback(Object.assign(new Error('Refused on request'), { responseCode: refusal }));
          }
          const recipients = session.envelope.rcptTo.map((recipient) => recipient.address);
          mails.push(asReceived(++received, parsed, recipients));
          if (mails.length > KEPT) mails.shift();
          return callback();
        },
        (error: Error) => callback(error),
      );
    },
  });
  smtp.on('error', () => undefined);
  const http = createServer((request, response) => {
    answer(request, response, mails, (code) => (refusal = code)).catch(() => response.writeHead(400).end());
  });
  const smtpPort = await listen(smtp.server as unknown as Server, ports.smtp ?? 0);
  const mailboxPort = await listen(http, ports.mailbox ?? 0);
  return {
    smtpUrl: `smtp://127.0.0.1:${smtpPort}`,
    mailboxUrl: `http://127.0.0.1:${mailboxPort}`,
    mails,
    refuseWith: (code) => (refusal = code),
    async stop() {
      http.closeAllConnections();
      await Promise.all([
        new Promise<void>((resolve) => smtp.close(() => resolve())),
        new Promise<void>((resolve) => http.close(() => resolve())),
      ]);
    },
  };
}

function asReceived(number: number, parsed: ParsedMail, recipients: string[]): ReceivedMail {
  return {
    number,
    receivedAt: new Date().toISOString(),
    from: parsed.from?.text ?? '',
    recipients,
    subject: parsed.subject ?? '',
    messageId: parsed.messageId ?? '',
    text: parsed.text ?? '',
    html: parsed.html || null,
    attachments: parsed.attachments.map((one) => ({ fileName: one.filename ?? 'unnamed', byteSize: one.size })),
  };
}

async function answer(
  request: IncomingMessage,
  response: ServerResponse,
  mails: readonly ReceivedMail[],
  refuseWith: (code: number | null) => void,
): Promise<void> {
  const path = new URL(request.url ?? '/', 'http://mailbox').pathname;
  if (request.method === 'PUT' && path === '/refusal') {
    const chunks: Buffer[] = [];
    for await (const chunk of request) chunks.push(chunk as Buffer);
    const { code } = JSON.parse(Buffer.concat(chunks).toString('utf8')) as { code: unknown };
    if (code !== null && !(Number.isInteger(code) && Number(code) >= 400 && Number(code) < 600)) {
      response.writeHead(422).end('code must be null or a number from 400 to 599');
      return;
    }
    refuseWith(code as number | null);
    response.writeHead(204).end();
  } else if (path === '/mails.json') {
    response.writeHead(200, { 'content-type': 'application/json' }).end(JSON.stringify(mails));
  } else {
    const one = mails.find((mail) => path === `/mails/${mail.number}`);
    if (path !== '/' && !one) return void response.writeHead(404).end('There is no such mail.');
    response
      .writeHead(200, {
        'content-type': 'text/html; charset=utf-8',
        'content-security-policy': "default-src 'none'; style-src 'unsafe-inline'; frame-src 'self'",
      })
      .end(one ? mailPage(one) : mailboxPage(mails));
  }
}

function listen(server: Server, port: number): Promise<number> {
  return new Promise((resolve, reject) => {
    server.once('error', reject);
    server.listen(port, '127.0.0.1', () => resolve((server.address() as AddressInfo).port));
  });
}
