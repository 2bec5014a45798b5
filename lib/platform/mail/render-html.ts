import type { Letter } from './queue-mail';

const ESCAPES: Record<string, string> = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;', "'": '&#39;' };
const escape = (text: string) => text.replace(/[&<>"']/g, (character) => ESCAPES[character] ?? character);

const INK = '#23272b';
const PAPER = '#f3efe6';
const SHEET = '#fcfaf5';

/** A letter as HTML: one column that a phone shows without zooming, colours of the site, nothing loaded from outside. */
export function renderHtml(letter: Pick<Letter, 'subject' | 'paragraphs'>, origin: string): string {
  const body = letter.paragraphs
    .map((part) =>
      typeof part === 'string'
        ? `<p style="margin:0 0 16px">${escape(part).replaceAll('\n', '<br>')}</p>`
        : `<p style="margin:0 0 20px"><a href="${escape(part.href)}" style="display:inline-block;padding:12px 18px;background:${INK};color:${SHEET};text-decoration:none;border-radius:3px">${escape(part.label)}</a><br><span style="font-size:13px;word-break:break-all">${escape(part.href)}</span></p>`,
    )
    .join('\n');
  return `<!doctype html>
<html lang="en"><head><meta charset="utf-8"><meta name="viewport" content="width=device-width, initial-scale=1"><title>${escape(letter.subject)}</title></head>
<body style="margin:0;background:${PAPER};color:${INK};font:16px/1.5 sans-serif">
<div style="max-width:560px;margin:0 auto;padding:24px 20px;background:${SHEET}">
<p style="margin:0 0 20px;font-weight:bold">Wattcairn</p>
${body}
<p style="margin:24px 0 0;font-size:13px">${escape(origin)}</p>
</div></body></html>`;
}
