const fills = [
  '',
  'bg-crew-1 text-on-crew-1',
  'bg-crew-2 text-on-crew-2',
  'bg-crew-3 text-on-crew-3',
  'bg-crew-4 text-on-crew-4',
  'bg-crew-5 text-on-crew-5',
  'bg-crew-6 text-on-crew-6',
]

type Props = { letter: string; colour: number; name: string; className?: string }

/** A crew's letter on its colour; the colour never stands alone. */
export function CrewPennant({ letter, colour, name, className = 'h-6 w-7 text-sm' }: Props) {
  return (
    <span
      role="img"
      aria-label={name}
      title={name}
      className={`inline-flex shrink-0 items-center justify-start border border-ink/30 pl-1.5 font-extrabold leading-none [clip-path:polygon(0_0,100%_0,82%_50%,100%_100%,0_100%)] ${fills[colour] ?? fills[6]} ${className}`}
    >
      {letter}
    </span>
  )
}
