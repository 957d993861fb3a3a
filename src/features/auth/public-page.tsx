import { type ReactNode, useEffect } from 'react'

/** The frame of the few screens before sign-in. */
export function PublicPage({ title, children }: { title: string; children: ReactNode }) {
  useEffect(() => {
    document.title = `${title} · Ridgehand`
  }, [title])
  return (
    <main className="mx-auto flex min-h-dvh max-w-md flex-col justify-center px-4 py-8">
      <div className="mb-6 flex items-center gap-3">
        <img src="/ridgehand.svg" alt="" className="h-12 w-12" />
        <div>
          <p className="text-xl font-extrabold leading-tight">Ridgehand</p>
          <p className="text-ink-soft">The right roof, the right crew, the right day</p>
        </div>
      </div>
      <section className="rounded-md border border-rule bg-sheet p-5">
        <h1 className="mb-4 text-2xl font-extrabold">{title}</h1>
        {children}
      </section>
    </main>
  )
}
