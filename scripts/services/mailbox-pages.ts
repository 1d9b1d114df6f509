import { escapeHtml, page } from './html-page.js';
import type { ReceivedMail } from './mail-server.js';

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
