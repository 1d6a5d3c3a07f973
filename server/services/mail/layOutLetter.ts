import type { Language } from '../../../shared/messages/translate.ts'
import { escapeHtml } from '../../escapeHtml.ts'
import type { LetterText } from './letters/letterKind.ts'

/** A letter in whole words, its link whole too. */
export type LaidOut = Omit<LetterText, 'action'> & {
  language: Language
  greeting: string
  action?: { label: string; url: string }
  foot: string[]
}

/** The plain part: the same facts in the same order. */
export function layOutText({ greeting, paragraphs, rows, action, closing, foot }: LaidOut): string {
  const parts = [
    greeting,
    ...paragraphs,
    ...(rows ? [rows.map(({ label, value }) => `${label}: ${value}`).join('\n')] : []),
    ...(action ? [`${action.label}:\n${action.url}`] : []),
    ...(closing ?? []),
    `-- \n${foot.join('\n')}`,
  ]
  return `${parts.join('\n\n')}\n`
}

const FONT = "font-family:'Noto Sans',Arial,sans-serif;font-size:16px;line-height:24px;color:#26302f"
const SMALL = "font-family:'Noto Sans',Arial,sans-serif;font-size:13px;line-height:18px;color:#5a4a3c"

/** The HTML part: one column, nothing to fetch, readable without any of its styles. All that is not ours is escaped. */
export function layOutHtml({ language, subject, greeting, paragraphs, rows, action, closing, foot }: LaidOut): string {
  const paragraph = (text: string, style = FONT) => `<p style="margin:0 0 16px;${style}">${escapeHtml(text)}</p>`
  const content = [
    paragraph(greeting),
    ...paragraphs.map((text) => paragraph(text)),
    ...(rows ? [rowsHtml(rows)] : []),
    ...(action ? [actionHtml(action)] : []),
    ...(closing ?? []).map((text) => paragraph(text)),
    ...foot.map((text) => paragraph(text, SMALL)),
  ]
  return `<!doctype html>
<html lang="${language}"><head><meta charset="utf-8"><meta name="viewport" content="width=device-width"><meta name="color-scheme" content="light dark"><title>${escapeHtml(subject)}</title></head>
<body style="margin:0;padding:0;background:#f7f4ec"><div lang="${language}">
<table role="presentation" width="100%" cellpadding="0" cellspacing="0" border="0"><tr><td align="center" style="padding:24px 12px">
<table role="presentation" width="100%" cellpadding="0" cellspacing="0" border="0" style="max-width:560px;background:#ffffff;border-top:4px double #53386b"><tr><td align="left" style="padding:28px">
<h1 style="margin:0 0 20px;font-family:'Noto Sans',Arial,sans-serif;font-size:20px;line-height:26px;font-weight:700;color:#26302f">${escapeHtml(subject)}</h1>
${content.join('\n')}
</td></tr></table></td></tr></table></div></body></html>
`
}

function rowsHtml(rows: { label: string; value: string }[]): string {
  const line = 'border-bottom:1px solid #ded8c9;padding:6px 0'
  const cells = rows.map(({ label, value }) =>
    `<tr><th align="left" scope="row" style="${line};${SMALL};font-weight:600;padding-right:16px">${escapeHtml(label)}</th><td align="left" style="${line};${FONT}">${escapeHtml(value)}</td></tr>`)
  return `<table cellpadding="0" cellspacing="0" border="0" width="100%" style="margin:0 0 20px;border-collapse:collapse">${cells.join('')}</table>`
}

/** A link that looks like a button, and its address in letters for where links are cut off. */
function actionHtml({ label, url }: { label: string; url: string }): string {
  const safeUrl = escapeHtml(url)
  return `<p style="margin:0 0 16px"><a href="${safeUrl}" style="display:inline-block;padding:14px 22px;background:#53386b;color:#ffffff;text-decoration:none;font-family:'Noto Sans',Arial,sans-serif;font-size:16px;line-height:20px;font-weight:600">${escapeHtml(label)}</a></p>
<p style="margin:0 0 16px;${SMALL};word-break:break-all">${safeUrl}</p>`
}
