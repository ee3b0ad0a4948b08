import type { Mail } from './mailbox.js';

/** The list, newest first. */
export function listPage(mails: readonly Mail[]): string {
  const rows = mails.map(
    (mail) =>
      `<tr><td><time>${escapeHtml(mail.receivedAt)}</time></td><td>${escapeHtml(mail.to.join(', '))}</td>` +
      `<td><a href="/messages/${mail.id}">${escapeHtml(mail.subject || '(no subject)')}</a></td></tr>`,
  );
  const body =
    rows.length === 0
      ? '<p>No mail yet. What the app sends shows up here; nothing leaves this machine.</p>'
      : `<table><thead><tr><th>Received</th><th>To</th><th>Subject</th></tr></thead><tbody>${rows.join('')}</tbody></table>`;
  return page('Mailbox', body);
}

/** One mail: its text with links to follow, and its HTML in a frame where no script runs. */
export function mailPage(mail: Mail): string {
  const html =
    mail.html === null
      ? ''
      : `<h2>As HTML</h2><iframe title="The mail as HTML" sandbox="allow-popups allow-popups-to-escape-sandbox"
         srcdoc="${escapeHtml(`<base target="_blank">${mail.html}`)}"></iframe>`;
  const headers = Object.entries(mail.headers).map(([name, value]) => `${name}: ${value}`);
  return page(
    mail.subject,
    `<p><a href="/">All mail</a></p>
     <dl><dt>From</dt><dd>${escapeHtml(mail.from)}</dd><dt>To</dt><dd>${escapeHtml(mail.to.join(', '))}</dd></dl>
     <h2>As text</h2><pre>${withLinks(escapeHtml(mail.text))}</pre>${html}
     ${attachmentList(mail)}
     <details><summary>Headers</summary><pre>${escapeHtml(headers.join('\n'))}</pre></details>`,
  );
}

/** Links from which a file is saved; none is opened in the page, for what is in it comes from others. */
function attachmentList({ attachments = [] }: Mail): string {
  if (attachments.length === 0) return '';
  const items = attachments.map(
    ({ name, base64 }) =>
      `<li><a download="${escapeHtml(name)}" href="data:application/octet-stream;base64,${base64}">${escapeHtml(name)}</a></li>`,
  );
  return `<h2>Attached</h2><ul>${items.join('')}</ul>`;
}

export function escapeHtml(text: string): string {
  const entities: Record<string, string> = {
    '&': '&amp;',
    '<': '&lt;',
    '>': '&gt;',
    '"': '&quot;',
    "'": '&#39;',
  };
  return text.replace(/[&<>"']/g, (character) => entities[character] ?? character);
}

function withLinks(escaped: string): string {
  return escaped.replace(
    /https?:\/\/(?:(?!&(?:lt|gt|quot|#39);)\S)+/g,
    (address) => `<a href="${address}" target="_blank" rel="noopener">${address}</a>`,
  );
}

function page(title: string, body: string): string {
  return `<!doctype html><html lang="en"><head><meta charset="utf-8"><meta name="viewport" content="width=device-width">
<title>${escapeHtml(title)} – Shimlore mailbox</title><style>
body{font:1rem/1.5 system-ui,sans-serif;max-width:60rem;margin:1rem auto;padding:0 1rem;color:#12263a;background:#fbfbf8}
table{border-collapse:collapse;width:100%}th,td{text-align:left;padding:.4rem;border-bottom:1px solid #b9c4cf}
pre{white-space:pre-wrap;overflow-wrap:anywhere;background:#fff;border:1px solid #b9c4cf;padding:1rem}
iframe{width:100%;height:30rem;border:1px solid #b9c4cf;background:#fff}a{color:#123f7a}</style></head>
<body><h1>${escapeHtml(title)}</h1>${body}</body></html>`;
}
