import type { CreateModel } from '@/lib/schemas/model';

/** A model of the demo, with how often its units go out against the others. */
export type DemoModel = {
  /** Begins the serial numbers of its hulls; never I, O or Q (33 CFR 181.25). */
  letter: string;
  popularity: number;
  input: CreateModel;
};

/** Models of no maker: none, single, twin, triple and quadruple carburettors, two- and four-stroke, electric. */
export const MODELS: readonly DemoModel[] = [
  {
    letter: 'P',
    popularity: 0.85,
    input: { name: 'Pipit', propulsion: 'jet', stroke: 'two', engines: 1, cylinders: 2, carbCount: 1 },
  },
  {
    letter: 'T',
    popularity: 1.15,
    input: { name: 'Twinfin', propulsion: 'jet', stroke: 'two', engines: 1, cylinders: 2, carbCount: 2 },
  },
  {
    letter: 'R',
    popularity: 1.2,
    input: { name: 'Trefoil', propulsion: 'jet', stroke: 'two', engines: 1, cylinders: 3, carbCount: 3 },
  },
  {
    letter: 'K',
    popularity: 1.1,
    input: { name: 'Quartet', propulsion: 'jet', stroke: 'four', engines: 1, cylinders: 4, carbCount: 4 },
  },
  {
    letter: 'S',
    popularity: 0.8,
    input: { name: 'Silent Tern', propulsion: 'electric', engines: 1, cylinders: 0, carbCount: 0 },
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
    },
  },
];
