type Props = { left: string; middle: string }

/** Text inside a CSS string: nothing in it can end the string or the style. */
function cssString(text: string): string {
  return `"${text.replaceAll(/["\\<\n]/g, (sign) => `\\${sign.charCodeAt(0).toString(16)} `)}"`
}

/** What stands in the foot of every printed page, with its page number. */
export function PrintFoot({ left, middle }: Props) {
  const foot = 'font: 9pt sans-serif; color: #000;'
  return (
    <style>
      {`@page {
  @bottom-left { content: ${cssString(left)}; ${foot} }
  @bottom-center { content: ${cssString(middle)}; ${foot} }
  @bottom-right { content: "Page " counter(page) " of " counter(pages); ${foot} }
}`}
    </style>
  )
}
