/** How long a lag is in words: seconds under two minutes, then whole minutes, then whole hours. */
export function lagText(seconds: number): string {
  if (seconds < 120) return `${Math.round(seconds)} ${Math.round(seconds) === 1 ? 'second' : 'seconds'}`;
  if (seconds < 7_200) return `${Math.floor(seconds / 60)} minutes`;
  return `${Math.floor(seconds / 3_600)} hours`;
}

/** Says that the worker is behind; announced once, not at each second. Draws nothing while it keeps up (null). */
export function LagLine({ seconds }: { seconds: number | null }) {
  if (seconds === null) return null;
  return (
    <p
      role="status"
      className="border-y-2 border-warn bg-warn-tint px-gutter py-2 text-center font-semibold text-warn"
    >
      Background work is <span aria-live="off">{lagText(seconds)}</span> behind. New due points and tasks may
      be missing; overdue units are held all the same.
    </p>
  );
}
