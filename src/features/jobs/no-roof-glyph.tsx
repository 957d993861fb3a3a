/** Holds the place of a roof that has not been issued. */
export function NoRoofGlyph({ sizePx }: { sizePx: number }) {
  return (
    <span
      aria-hidden
      style={{ width: sizePx, height: sizePx }}
      className="flex shrink-0 items-center justify-center"
    >
      <span className="h-2/3 w-5/6 rounded-sm border-2 border-dashed border-ink-soft" />
    </span>
  )
}
