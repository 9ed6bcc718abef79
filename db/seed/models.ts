import type { CreateModel } from '@/lib/schemas/model';

/** A model of the demo, with how often its units go out against the others. */
export type DemoModel = {
  /** Begins the serial numbers of its hulls; never I, O or Q (33 CFR 181.25). */
  letter: string;
  popularity: number;
  input: CreateModel;
};

type Specs = NonNullable<CreateModel['specs']>;
/** Limits of the demo's craft: invented, of no maker. What is real stands in the engine maker's manual. */
const TWO_STROKE: Specs = {
  'Pop-off pressure': { min: 21, max: 37, unit: 'psi', repeats: 2, maxSpread: { amount: 1, of: 'unit' } },
  'Low-speed screw': { min: 1, max: 1.5, target: 1.25, unit: 'turns' },
  'High-speed screw': { min: 0, max: 0.25, target: 0, unit: 'turns' },
  'Fine adjustment': { min: -0.25, max: 0.25, target: 0, unit: 'turns' },
  Compression: { min: 110, unit: 'psi', maxDifference: { amount: 10, of: 'percent' } },
  'Spark plug gap': { min: 0.5, max: 0.7, unit: 'mm' },
  'Impeller clearance': { max: 0.6, unit: 'mm' },
  'Battery at rest': { min: 12.4, unit: 'V' },
  'Charging voltage': { min: 13.4, max: 14.8, unit: 'V' },
};
const FOUR_STROKE: Specs = {
  ...TWO_STROKE,
  Compression: { min: 150, unit: 'psi', maxDifference: { amount: 15, of: 'percent' } },
  'Spark plug gap': { min: 0.8, max: 0.9, unit: 'mm' },
};
const ELECTRIC: Specs = { 'Impeller clearance': { max: 0.6, unit: 'mm' } };
/** Injected: nothing of a carburettor. */
const INJECTED: Specs = Object.fromEntries(
  ['Compression', 'Spark plug gap', 'Battery at rest', 'Charging voltage'].map((name) => [
    name,
    FOUR_STROKE[name]!,
  ]),
);

/** Models of no maker: none, single, twin, triple and quadruple carburettors, two- and four-stroke, electric. */
export const MODELS: readonly DemoModel[] = [
  {
    letter: 'P',
    popularity: 0.85,
    input: {
      name: 'Pipit',
      propulsion: 'jet',
      stroke: 'two',
      engines: 1,
      cylinders: 2,
      carbCount: 1,
      specs: TWO_STROKE,
    },
  },
  {
    letter: 'T',
    popularity: 1.15,
    input: {
      name: 'Twinfin',
      propulsion: 'jet',
      stroke: 'two',
      engines: 1,
      cylinders: 2,
      carbCount: 2,
      specs: TWO_STROKE,
    },
  },
  {
    letter: 'R',
    popularity: 1.2,
    input: {
      name: 'Trefoil',
      propulsion: 'jet',
      stroke: 'two',
      engines: 1,
      cylinders: 3,
      carbCount: 3,
      specs: TWO_STROKE,
    },
  },
  {
    letter: 'K',
    popularity: 1.1,
    input: {
      name: 'Quartet',
      propulsion: 'jet',
      stroke: 'four',
      engines: 1,
      cylinders: 4,
      carbCount: 4,
      specs: FOUR_STROKE,
    },
  },
  {
    letter: 'S',
    popularity: 0.8,
    input: {
      name: 'Silent Tern',
      propulsion: 'electric',
      engines: 1,
      cylinders: 0,
      carbCount: 0,
      specs: ELECTRIC,
    },
  },
  {
    letter: 'B',
    popularity: 0.75,
    input: {
      name: 'Bittern launch',
      propulsion: 'outboard',
      stroke: 'four',
      engines: 1,
      cylinders: 4,
      carbCount: 0,
      specs: INJECTED,
    },
  },
];
