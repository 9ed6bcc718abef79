import type { Model } from '@/lib/schemas/model';

export const PROPULSION_WORDS: Record<Model['propulsion'], string> = {
  jet: 'Jet',
  outboard: 'Outboard',
  inboard: 'Inboard',
  electric: 'Electric',
};

export const STROKE_WORDS = { two: 'Two-stroke', four: 'Four-stroke' } as const;

const counted = (count: number, one: string) => `${count} ${count === 1 ? one : `${one}s`}`;

/** What drives a model, in words: 'Jet, two-stroke, 1 engine, 2 cylinders, 2 carburettors'. */
export function engineText({ propulsion, stroke, engines, cylinders, carbCount }: Model): string {
  return [
    PROPULSION_WORDS[propulsion],
    ...(stroke ? [STROKE_WORDS[stroke].toLowerCase()] : []),
    counted(engines, propulsion === 'electric' ? 'motor' : 'engine'),
    ...(cylinders > 0 ? [counted(cylinders, 'cylinder')] : []),
    ...(propulsion === 'electric'
      ? []
      : [carbCount === 0 ? 'no carburettor' : counted(carbCount, 'carburettor')]),
  ].join(', ');
}
