/** Grey bars in the shape of what is coming. */
export function Skeleton({ className = 'h-6' }: { className?: string }) {
  return <div aria-hidden className={`animate-pulse rounded-md bg-rule ${className}`} />
}

export function PageSkeleton() {
  return (
    <div role="status" aria-label="Loading" className="space-y-4">
      <Skeleton className="h-8 w-56" />
      <Skeleton className="h-28" />
      <Skeleton className="h-28" />
      <Skeleton className="h-28" />
    </div>
  )
}
