/** @typedef {import('./mail-store.mjs').Message} Message */

/** @param {string} text */
const escape = (text) =>
  text.replace(/[&<>"']/g, (sign) => `&#${sign.charCodeAt(0)};`);

/** @param {string} title @param {string} body */
const page = (title, body) => `<!doctype html>
<html lang="en">
<head>
<meta charset="utf-8">
<meta name="viewport" content="width=device-width, initial-scale=1">
<meta name="color-scheme" content="light dark">
<title>${escape(title)}</title>
<link rel="icon" href="data:,">
<style>
body { font: 1rem/1.5 system-ui, sans-serif; max-width: 60rem; margin: 2rem auto; padding: 0 1rem; }
table { border-collapse: collapse; width: 100%; }
th, td { text-align: left; padding: .4rem .6rem .4rem 0; border-bottom: 1px solid #8886; vertical-align: top; }
td, dd { overflow-wrap: anywhere; }
pre { white-space: pre-wrap; overflow-wrap: anywhere; }
dl { display: grid; grid-template-columns: max-content 1fr; gap: .2rem 1rem; }
dd { margin: 0; }
iframe { width: 100%; height: 30rem; border: 1px solid #8886; background: #fff; }
</style>
</head>
<body>
${body}
</body>
</html>
`;

/** @param {Message} message */
const row = (message) => `<tr>
<td><time datetime="${message.receivedAt}">${message.receivedAt.slice(0, 19).replace('T', ' ')}</time></td>
<td>${escape(message.to.join(', '))}</td>
<td><a href="/message/${message.id}">${escape(message.subject)}</a></td>
</tr>`;

/** @param {Message[]} messages */
export function listPage(messages) {
  const table = `<table>
<thead><tr><th scope="col">Received (UTC)</th><th scope="col">To</th><th scope="col">Subject</th></tr></thead>
<tbody>
${messages.map(row).join('\n')}
</tbody>
</table>`;
  const body = messages.length > 0 ? table : '<p>No mail yet. What Fourfold sends appears here and goes nowhere else.</p>';
  return page('Mail inbox', `<main>\n<h1>Mail inbox</h1>\n${body}\n</main>`);
}

/** @param {Message} message */
export function messagePage(message) {
  const html =
    message.html === null ? '' : `<h2>HTML</h2>\n<iframe title="The message as HTML" sandbox src="/message/${message.id}/html"></iframe>`;
  return page(
    message.subject,
    `<nav><a href="/">Mail inbox</a></nav>
<main>
<h1>${escape(message.subject)}</h1>
<dl>
<dt>From</dt><dd>${escape(message.from)}</dd>
<dt>To</dt><dd>${escape(message.to.join(', '))}</dd>
<dt>Received</dt><dd>${escape(message.receivedAt)}</dd>
</dl>
<h2>Text</h2>
<pre>${linked(escape(message.text))}</pre>
${html}
<p><a href="/message/${message.id}/source">Source</a></p>
</main>`,
  );
}

/** @param {string} escaped */
const linked = (escaped) => escaped.replace(/https?:\/\/[^\s<>]+/g, (url) => `<a href="${url}">${url}</a>`);
