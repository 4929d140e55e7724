import type { Letter } from './letter';

const entities: Record<string, string> = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;', "'": '&#39;' };

function escape(text: string): string {
  return text.replace(/[&<>"']/g, (character) => entities[character] ?? character);
}

// Mail readers know neither stylesheets nor variables: the light theme's paper, ink, graphite, rule and pen, written out.
const ink = 'color:#14212b';
const face = "font-family:'Source Sans 3',Helvetica,Arial,sans-serif";
const small = `font-size:13px;line-height:20px;color:#4a5863;${face}`;

/** A letter as HTML that needs no images and reads in one column on a phone. */
export function letterHtml({ subject, paragraphs, facts, action, note }: Letter): string {
  const body = paragraphs.map((text) => `<p style="margin:0 0 16px;font-size:15px;line-height:24px;${ink};${face}">${escape(text)}</p>`).join('\n');
  const rows = facts.map(({ name, value }) => `<tr><th scope="row" align="left" valign="top" style="padding:4px 16px 4px 0;font-weight:normal;white-space:nowrap;${small}">${escape(name)}</th><td style="padding:4px 0;font-size:14px;line-height:20px;${ink};${face}">${escape(value)}</td></tr>`).join('\n');
  const table = facts.length === 0 ? '' : `<table role="presentation" cellpadding="0" cellspacing="0" style="margin:0 0 16px;border-top:1px solid #ccd6d5;border-bottom:1px solid #ccd6d5">\n${rows}\n</table>`;
  const link = action === null ? '' : `<p style="margin:0 0 16px"><a href="${escape(action.url)}" style="display:inline-block;padding:10px 16px;border:1px solid #14212b;font-size:15px;line-height:20px;text-decoration:none;${ink};${face}">${escape(action.label)}</a></p>
<p style="margin:0 0 16px;word-break:break-all;${small}">${escape(action.url)}</p>`;
  return `<!doctype html>
<html lang="en">
<head><meta charset="utf-8"><meta name="viewport" content="width=device-width"><title>${escape(subject)}</title></head>
<body style="margin:0;padding:24px 16px;background:#fbfcfa">
<div style="max-width:560px;margin:0 auto">
<p style="margin:0 0 24px;font-size:18px;line-height:24px;font-family:'STIX Two Text',Georgia,serif;${ink}">Fourfold</p>
${body}
${table}
${link}
<p style="margin:24px 0 0;padding-top:12px;border-top:1px solid #ccd6d5;${small}">${escape(note)}</p>
</div>
</body>
</html>
`;
}
