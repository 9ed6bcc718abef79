/**
 * A line that fills from left to right. `value` of `max`; without a value it says that work goes on
 * without an end in sight.
 */
export function Progress({ label, value, max = 100 }: { label: string; value?: number; max?: number }) {
  const share = value === undefined ? null : Math.min(1, Math.max(0, max > 0 ? value / max : 0));
  return (
    <div className="grid content-start gap-1">
      <span className="flex justify-between gap-4">
        <span>{label}</span>
        {share === null ? null : <span className="numerals">{Math.round(share * 100)} %</span>}
      </span>
      <svg
        viewBox="0 0 100 6"
        preserveAspectRatio="none"
        className="h-2 w-full"
        role="progressbar"
        aria-label={label}
        aria-valuemin={0}
        aria-valuemax={100}
        aria-valuenow={share === null ? undefined : Math.round(share * 100)}
      >
        <rect width="100" height="6" className="fill-hairline" />
        <rect width={share === null ? 30 : share * 100} height="6" className="fill-line" />
      </svg>
    </div>
  );
}
