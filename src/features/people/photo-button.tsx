import { Camera } from 'lucide-react'
import { type ChangeEvent, useState } from 'react'
import { photoMaxBytes, photoTypes } from '../../../shared/http/upload.ts'
import { failureText, issueAt } from '../../lib/failure-text.ts'
import { useSetPhoto } from './ticket-queries.ts'

type Props = {
  owned: { personId: string; ticketId: string }
  title: string
  hasPhoto: boolean
}

const mb = 1024 * 1024
const tooLarge = `That picture is over ${photoMaxBytes / mb} MB. Choose a smaller one.`

/** Chooses a photo of a card, or takes one on a phone, and sends it. */
export function PhotoButton({ owned, title, hasPhoto }: Props) {
  const send = useSetPhoto()
  const [fault, setFault] = useState<string | null>(null)
  const choose = (event: ChangeEvent<HTMLInputElement>) => {
    const [photo] = event.target.files ?? []
    event.target.value = ''
    if (!photo) return
    const isLarge = photo.size > photoMaxBytes
    setFault(isLarge ? tooLarge : null)
    if (!isLarge) send.mutate({ ...owned, photo })
  }
  const words = send.isPending ? 'Sending the photo' : hasPhoto ? 'New photo' : 'Add a photo'
  const text = fault ?? issueAt(send.error, 'photo') ?? failureText(send.error)
  return (
    <>
      <label
        className={`inline-flex min-h-11 cursor-pointer items-center gap-2 rounded-md px-2 font-semibold text-chalk underline-offset-4 hover:underline has-focus-visible:outline-3 has-focus-visible:outline-chalk ${send.isPending ? 'opacity-50' : ''}`}
      >
        <Camera size={18} aria-hidden />
        {words}
        <input
          type="file"
          className="sr-only"
          aria-label={`${words} of the card: ${title}`}
          accept={photoTypes.join(',')}
          disabled={send.isPending}
          onChange={choose}
        />
      </label>
      {text ? (
        <p role="alert" className="w-full font-semibold text-stop">
          {text}
        </p>
      ) : null}
    </>
  )
}
