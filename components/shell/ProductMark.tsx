/** The product's sign and name: a hull above its water line, with plumb ticks below. */
export function ProductMark({ compact = false }: { compact?: boolean }) {
  return (
    <span className="inline-flex items-center gap-2.5">
      <svg viewBox="0 0 48 40" className="h-9 w-11 text-line" aria-hidden="true">
        <path d="M3 12h42c-2 8-7 12-15 12H15C8.500 24 4.500 20 3 12Z" fill="currentColor" />
        <path d="m15 12 4-7h11l4 7" fill="none" stroke="currentColor" strokeWidth="3" />
        <path d="M0 28.500h48" stroke="currentColor" strokeWidth="3" />
        <path d="M8 30v5m8-5v5m8-5v9m8-9v5m8-5v5" stroke="currentColor" strokeWidth="2" />
      </svg>
      {compact ? (
        <span className="sr-only">Wakewright</span>
      ) : (
        <span className="text-xl font-extrabold tracking-tight">Wakewright</span>
      )}
    </span>
  );
}
