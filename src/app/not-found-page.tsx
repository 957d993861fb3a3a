import { Link } from 'react-router-dom'

export function NotFoundPage() {
  return (
    <section className="mx-auto max-w-lg py-16 text-center">
      <h1 className="text-2xl font-extrabold">There is no page here</h1>
      <p className="mt-2 text-ink-soft">
        The address may be mistyped, or what it showed may be gone.
      </p>
      <p className="mt-6">
        <Link to="/" className="font-semibold text-chalk underline">
          Go to the start
        </Link>
      </p>
    </section>
  )
}
