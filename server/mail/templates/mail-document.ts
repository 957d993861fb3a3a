/**
 * A mail as blocks, from which both parts are made, so that text and HTML never say different things.
 * Nothing is loaded from anywhere: no pictures, fonts or style sheets.
 */
export type MailBlock =
  | { kind: 'heading'; text: string }
  | { kind: 'subheading'; text: string }
  | { kind: 'paragraph'; text: string }
  | { kind: 'caution'; text: string }
  | { kind: 'facts'; facts: [label: string, value: string][] }
  | { kind: 'list'; items: string[] }
  /** One line of the cut list: what to do, then the numbers. */
  | { kind: 'card'; title: string; lines: string[] }
  /** `url` null: the link is secret and left out of what is kept. */
  | { kind: 'link'; label: string; url: string | null }

export type MailDocument = { subject: string; blocks: MailBlock[] }

export const linkLeftOut = '[link left out]'

const ink = '#1e272c'
const inkSoft = '#55616a'
const rule = '#d8cfbf'
const clay = '#a8431f'
const ochre = '#8a5a00'

export function escapeHtml(text: string): string {
  return text
    .replaceAll('&', '&amp;')
    .replaceAll('<', '&lt;')
    .replaceAll('>', '&gt;')
    .replaceAll('"', '&quot;')
    .replaceAll("'", '&#39;')
}

function withBreaks(text: string): string {
  return escapeHtml(text).replaceAll('\n', '<br>')
}

function textOf(block: MailBlock): string {
  switch (block.kind) {
    case 'heading':
      return `${block.text}\n${'='.repeat(Math.min(block.text.length, 60))}`
    case 'subheading':
      return `${block.text}\n${'-'.repeat(Math.min(block.text.length, 60))}`
    case 'paragraph':
    case 'caution':
      return block.text
    case 'facts':
      return block.facts.map(([label, value]) => `${label}: ${value}`).join('\n')
    case 'list':
      return block.items.map((item) => `* ${item}`).join('\n')
    case 'card':
      return [block.title, ...block.lines.map((line) => `  ${line}`)].join('\n')
    case 'link':
      return `${block.label}:\n${block.url ?? linkLeftOut}`
  }
}

function factRow([label, value]: [string, string]): string {
  return `<tr><th scope="row" style="text-align:left;vertical-align:top;padding:2px 12px 2px 0;color:${inkSoft};font-weight:600">${escapeHtml(label)}</th><td style="padding:2px 0">${withBreaks(value)}</td></tr>`
}

function cardHtml(title: string, lines: string[]): string {
  // The first line is the length to saw: it is read first and from furthest off.
  const size = (i: number) => (i === 0 ? ';font-size:18px;font-weight:600' : '')
  const rows = lines
    .map((line, i) => `<div style="margin-top:4px${size(i)}">${escapeHtml(line)}</div>`)
    .join('')
  return `<div style="margin:0 0 12px;padding:10px 12px;border:1px solid ${rule};border-left:6px solid ${clay};border-radius:6px"><div style="font-size:18px;font-weight:800">${escapeHtml(title)}</div>${rows}</div>`
}

function linkHtml(label: string, url: string | null): string {
  if (url === null) return `<p>${escapeHtml(label)}: ${linkLeftOut}</p>`
  const safe = escapeHtml(url)
  return `<p style="margin:16px 0"><a href="${safe}" style="display:inline-block;padding:12px 18px;border-radius:6px;background:${clay};color:#ffffff;font-weight:600;text-decoration:none">${escapeHtml(label)}</a></p><p style="font-size:14px;color:${inkSoft};overflow-wrap:anywhere">${safe}</p>`
}

function htmlOf(block: MailBlock): string {
  switch (block.kind) {
    case 'heading':
      return `<h1 style="margin:0 0 8px;font-size:22px;line-height:1.25">${escapeHtml(block.text)}</h1>`
    case 'subheading':
      return `<h2 style="margin:20px 0 8px;font-size:18px;line-height:1.3">${escapeHtml(block.text)}</h2>`
    case 'paragraph':
      return `<p style="margin:0 0 12px">${withBreaks(block.text)}</p>`
    case 'caution':
      return `<p style="margin:0 0 12px;padding:8px 12px;border:1px solid ${ochre};border-left:6px solid ${ochre};border-radius:6px;font-weight:600">${withBreaks(block.text)}</p>`
    case 'facts':
      return `<table role="presentation" style="border-collapse:collapse;margin:0 0 12px">${block.facts.map(factRow).join('')}</table>`
    case 'list':
      return `<ul style="margin:0 0 12px;padding-left:20px">${block.items.map((item) => `<li>${escapeHtml(item)}</li>`).join('')}</ul>`
    case 'card':
      return cardHtml(block.title, block.lines)
    case 'link':
      return linkHtml(block.label, block.url)
  }
}

export function mailText(document: MailDocument): string {
  return `${document.blocks.map(textOf).join('\n\n')}\n`
}

export function mailHtml(document: MailDocument): string {
  const body = document.blocks.map(htmlOf).join('\n')
  return `<!doctype html>
<html lang="en-AU">
<head><meta charset="utf-8"><meta name="viewport" content="width=device-width, initial-scale=1"><title>${escapeHtml(document.subject)}</title></head>
<body style="margin:0;background:#ffffff;color:${ink};font-family:system-ui,-apple-system,'Segoe UI',sans-serif;font-size:16px;line-height:1.5"><div style="max-width:640px;margin:0 auto;padding:16px;overflow-wrap:anywhere">
${body}
</div></body>
</html>
`
}

/** A subject is one line, whatever was typed into a job's title. */
export function subjectLine(text: string): string {
  return text.replaceAll(/\s+/g, ' ').trim()
}
