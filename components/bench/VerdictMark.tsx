import { Tag } from '@/components/ui/Tag';
import type { Tone } from '@/components/ui/Notice';
import type { Judgement, Verdict } from '@/lib/domain/measurement';

const VERDICTS: Record<Verdict, { word: string; mark: string; tone: Tone }> = {
  in: { word: 'Within limits', mark: '✓', tone: 'ok' },
  out: { word: 'Out of limits', mark: '✗', tone: 'danger' },
  repeats_disagree: { word: 'Runs disagree', mark: '≠', tone: 'danger' },
  places_differ: { word: 'Too far apart', mark: '≠', tone: 'danger' },
  too_few_repeats: { word: 'More runs wanted', mark: '…', tone: 'warn' },
  no_limits: { word: 'Not judged', mark: '–', tone: 'info' },
};

/** A verdict in word, mark and colour, with its reason. */
export function VerdictMark({ judgement: { verdict, reason } }: { judgement: Judgement }) {
  const { word, mark, tone } = VERDICTS[verdict];
  return (
    <p className="flex flex-wrap items-center gap-2">
      <Tag tone={tone}>
        <span aria-hidden="true">{mark}&nbsp;</span>
        {word}
      </Tag>
      <span>{reason}</span>
    </p>
  );
}
