import type { ReceivedMail } from './mail-server.js';

const STYLE = `body{font:16px/1.5 system-ui,sans-serif;max-width:60rem;margin:2rem auto;padding:0 1rem;color-scheme:light dark}
table{border-collapse:collapse;width:100%}td,th{text-align:left;padding:.4rem .6rem;border-bottom:1px solid #8886}
pre{white-space:pre-wrap;font:inherit}iframe{width:100%;height:30rem;border:1px solid #8886;background:#fff}`;

export function escapeHtml(text: string): string {
  return text.replace(/[&<>"']/g, (character) => `&#${character.charCodeAt(0)};`);
}

export function page(title: string, body: string): string {
  return `<!doctype html><html lang="en"><meta charset="utf-8"><meta name="viewport" content="width=device-width"><link rel="icon" href="data:,"><title>${escapeHtml(title)}</title><style>${STYLE}</style><body><h1>${escapeHtml(title)}</h1>${body}</body></html>`;
}

export function mailboxPage(mails: readonly ReceivedMail[]): string {
  if (mails.length === 0) return page('Mailbox', '<p>No mail has come in yet.</p>');
  const rows = mails
    .toReversed()
    .map(
      (mail) =>
        `<tr><td>${escapeHtml(mail.receivedAt)}</td><td>${escapeHtml(mail.recipients.join(', '))}</td><td><a href="/mails/${mail.number}">${escapeHtml(mail.subject || '(no subject)')}</a></td></tr>`,
    );
  return page(
    'Mailbox',
    `<p>Nothing here was delivered to anybody. Newest first.</p><table><thead><tr><th>Received</th><th>To</th><th>Subject</th></tr></thead><tbody>${rows.join('')}</tbody></table>`,
  );
}

export function mailPage(mail: ReceivedMail): string {
  const attachments = mail.attachments.map((one) => `${one.fileName} (${one.byteSize} bytes)`).join(', ');
  // the mail's own HTML is shown in a frame that may run nothing and reach nothing
  const html = mail.html
    ? `<h2>As HTML</h2><iframe sandbox="" title="The mail as HTML" srcdoc="${escapeHtml(mail.html)}"></iframe>`
    : '';
  return page(
    mail.subject || '(no subject)',
    `<p><a href="/">All mails</a></p><table><tbody>${[
      ['From', mail.from],
      ['To', mail.recipients.join(', ')],
      ['Received', mail.receivedAt],
      ['Message-ID', mail.messageId],
      ['Attachments', attachments || 'none'],
    ]
      .map(([name, value]) => `<tr><th>${name}</th><td>${escapeHtml(value ?? '')}</td></tr>`)
      .join('')}</tbody></table><pre>${escapeHtml(mail.text)}</pre>${html}`,
  );
}
