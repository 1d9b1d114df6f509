import { createConnection } from 'node:net';
import { afterEach, beforeEach, expect, it } from 'vitest';
import { type RunningMailServer, startMailServer } from './mail-server.js';

let server: RunningMailServer;
beforeEach(async () => {
  server = await startMailServer();
});
afterEach(() => server.stop());

/** Sends one mail by hand and returns the server's answers, one a command. */
function send(subject: string, body: string): Promise<string[]> {
  const commands = [
    'EHLO test',
    'MAIL FROM:<statements@quarterpoise.example>',
    'RCPT TO:<wanda@example.com>',
    'DATA',
    `From: statements@quarterpoise.example\r\nTo: wanda@example.com\r\nMessage-ID: <one@quarterpoise.example>\r\nSubject: ${subject}\r\n\r\n${body}\r\n.`,
    'QUIT',
  ];
  const answers: string[] = [];
  return new Promise((resolve, reject) => {
    const socket = createConnection(Number(new URL(server.smtpUrl).port), '127.0.0.1');
    socket.setEncoding('utf8');
    let rest = '';
    socket.on('data', (chunk: string) => {
      rest += chunk;
      const end = /^\d{3} .*\r\n$/m.exec(rest);
      if (!end) return;
      answers.push(end[0].trim());
      rest = '';
      const next = commands.shift();
      if (next) socket.write(`${next}\r\n`);
    });
    socket.once('error', reject);
    socket.once('close', () => resolve(answers));
  });
}

it('keeps a mail and shows it, its markup made harmless', async () => {
  await send('Your <b>statement</b>', 'is <script>ready</script>');
  expect(server.mails).toMatchObject([
    { recipients: ['wanda@example.com'], messageId: '<one@quarterpoise.example>', subject: 'Your <b>statement</b>' },
  ]);
  const list = await (await fetch(server.mailboxUrl)).text();
  expect(list).toContain('Your &#60;b&#62;statement');
  const page = await (await fetch(`${server.mailboxUrl}/mails/1`)).text();
  expect(page).toContain('&#60;script&#62;ready');
  expect(page).not.toContain('<script>');
  expect(await (await fetch(`${server.mailboxUrl}/mails.json`)).json()).toHaveLength(1);
  expect((await fetch(`${server.mailboxUrl}/mails/2`)).status).toBe(404);
});

it('refuses on request and accepts again', async () => {
  const refuse = (code: unknown) =>
    fetch(`${server.mailboxUrl}/refusal`, { method: 'PUT', body: JSON.stringify({ code }) });
  expect((await refuse(451)).status).toBe(204);
  expect((await send('One', 'text')).some((answer) => answer.startsWith('451'))).toBe(true);
  expect(server.mails).toEqual([]);
  await refuse(null);
  await send('Two', 'text');
  expect(server.mails.map((mail) => mail.subject)).toEqual(['Two']);
  expect((await refuse(200)).status).toBe(422);
});
