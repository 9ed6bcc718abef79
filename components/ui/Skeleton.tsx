/** Stands in for `lines` lines while they load. Says so once to those who hear the page. */
export function Skeleton({ lines = 3, label = 'Loading' }: { lines?: number; label?: string }) {
  return (
    <div role="status" className="grid gap-3">
      <span className="sr-only">{label}</span>
      {Array.from({ length: lines }, (_, line) => (
        <span
          key={line}
          aria-hidden="true"
          className="block h-5 animate-pulse rounded bg-hairline last:w-2/3"
        />
      ))}
    </div>
  );
}
