import type { KeptMail } from './mailbox';

const escaped = (text: string) =>
  text.replaceAll('&', '&amp;').replaceAll('<', '&lt;').replaceAll('>', '&gt;').replaceAll('"', '&quot;');

/** The text with its links clickable. */
function linked(text: string): string {
  return escaped(text).replaceAll(
    /https?:\/\/[^\s<>"]+/g,
    (url) => `<a href="${url}" target="_blank" rel="noreferrer">${url}</a>`,
  );
}

function layout(title: string, content: string): string {
  return `<!doctype html><html lang="en"><meta charset="utf-8"><meta name="viewport" content="width=device-width">
<title>${escaped(title)}</title><style>
body{font:16px/1.5 system-ui,sans-serif;max-width:60rem;margin:2rem auto;padding:0 1rem}
table{border-collapse:collapse;width:100%}td,th{text-align:left;padding:.4rem;border-bottom:1px solid #ccc}
pre{white-space:pre-wrap;overflow-wrap:anywhere;background:#f4f4f4;padding:1rem}iframe{width:100%;height:32rem;border:1px solid #ccc}
</style>${content}</html>`;
}

export function listPage(mails: KeptMail[]): string {
  const rows = mails.map(
    ({ id, at, to, subject }) =>
      `<tr><td>${escaped(at.slice(0, 19).replace('T', ' '))}<td>${escaped(to.join(', '))}<td><a href="/mail/${id}">${escaped(subject)}</a>`,
  );
  const table = `<table><tr><th>Received (UTC)<th>To<th>Subject</tr>${rows.join('')}</table>`;
  return layout(
    'Mail received here',
    `<h1>Mail received here</h1><p>Nothing leaves this machine: what Trymark sends by email ends here.</p>${
      mails.length
        ? `${table}<form method="post" action="/delete"><p><button>Delete all</button></form>`
        : '<p>No mail yet.'
    }`,
  );
}

export function mailPage({ subject, from, to, at, text, html }: KeptMail): string {
  const shown = html
    ? `<h2>As HTML</h2><iframe title="The mail as HTML" sandbox="allow-popups allow-popups-to-escaped-sandbox" srcdoc="${escaped(`<base target="_blank">${html}`)}"></iframe>`
    : '';
  return layout(
    subject,
    `<p><a href="/">All mail</a><h1>${escaped(subject)}</h1><p>From ${escaped(from)}<br>To ${escaped(to.join(', '))}<br>${escaped(at)}
<h2>As text</h2><pre>${linked(text)}</pre>${shown}`,
  );
}
