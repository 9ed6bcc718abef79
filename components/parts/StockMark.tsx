import { cx } from '@/components/ui/cx';

const looks = {
  here: { word: 'Here', text: 'text-ok', fill: 12 },
  aside: { word: 'Set aside', text: 'text-info', fill: 12 },
  low: { word: 'Low', text: 'text-warn', fill: 4 },
  short: { word: 'Short', text: 'text-danger', fill: 0 },
  owed: { word: 'Count it', text: 'text-danger', fill: 0 },
};
export type StockState = keyof typeof looks;

/** How stock stands, as mark, word and colour together: a bin that is full, nearly empty, or empty. */
export function StockMark({ state, detail }: { state: StockState; detail?: string }) {
  const { word, text, fill } = looks[state];
  return (
    <span className={cx('inline-flex items-baseline gap-2 font-bold', text)}>
      <svg viewBox="0 0 20 20" className="size-4 shrink-0 translate-y-0.5" aria-hidden="true">
        <path d="M2 2v16h16V2" fill="none" stroke="currentColor" strokeWidth="2.5" />
        <path d={`M4.5 ${15.5 - fill}h11v${fill}h-11Z`} fill="currentColor" />
        {state === 'aside' ? <path d="M10 0v11l-3-3-3 3V0Z" className="fill-paper" /> : null}
      </svg>
      <span>
        {word}
        {detail ? ` ${detail}` : null}
      </span>
    </span>
  );
}
