import type { CaughtMail } from './mail.store.js';

const signs: Record<string, string> = {
  '&': '&amp;',
  '<': '&lt;',
  '>': '&gt;',
  '"': '&quot;',
  "'": '&#39;',
};

/** Makes text safe inside an element or a quoted attribute. */
export function escapeHtml(text: string): string {
  return text.replace(/[&<>"']/g, (sign) => signs[sign] ?? sign);
}

/** Escapes first, so that an address can bring nothing but itself into the page. */
export function textWithLinks(text: string): string {
  return escapeHtml(text).replace(
    /https?:\/\/[^\s<>]+?(?=(?:&gt;|&quot;|&#39;|[.,;:)\]])*(?:\s|$))/g,
    (address) => `<a href="${address}" rel="noreferrer">${address}</a>`,
  );
}

export const inboxCss = `
body { margin: 0 auto; max-width: 46rem; padding: 1.5rem; background: #f3f1ea; color: #23211c;
  font: 1rem/1.5 'Source Sans 3', system-ui, sans-serif; }
article { border-top: 1px solid #b9b2a0; padding: 1rem 0; }
h2 { font-size: 1.15rem; margin: 0; }
h2 a { color: inherit; }
p { margin: 0.1rem 0; color: #6a6457; overflow-wrap: anywhere; }
pre { font: inherit; white-space: pre-wrap; overflow-wrap: anywhere; margin: 0.75rem 0 0; }
article a { color: #7b3f0e; }
`;

function mailHtml(mail: CaughtMail): string {
  const files = mail.attachments.map((part) => part.filename ?? part.contentType).join(', ');
  return `<article aria-labelledby="mail-${mail.n}">
<h2 id="mail-${mail.n}"><a href="/messages/${mail.n}">${escapeHtml(mail.subject || '(no subject)')}</a></h2>
<p>To ${escapeHtml(mail.to.join(', '))}</p>
<p>From ${escapeHtml(mail.from)}${mail.date ? ` · ${escapeHtml(mail.date)}` : ''}</p>
${files ? `<p>Attached: ${escapeHtml(files)}</p>` : ''}<pre>${textWithLinks(mail.text)}</pre>
</article>`;
}

/** The inbox as a page, newest mail first. */
export function inboxPage(mails: CaughtMail[]): string {
  const list = [...mails].reverse().map(mailHtml).join('\n');
  return `<!doctype html>
<html lang="en">
<head><meta charset="utf-8"><meta name="viewport" content="width=device-width, initial-scale=1">
<title>Inbox (${mails.length})</title><link rel="stylesheet" href="/inbox.css"></head>
<body><main><h1>Inbox</h1>
<p>Every mail Wetside sends from this machine stops here. Nothing leaves it.</p>
${list || '<p>No mail yet.</p>'}
</main></body></html>`;
}
