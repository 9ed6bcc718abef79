import { expect, test } from 'vitest';
import { draftSpecs, readSpecs, specPath } from '@/components/models/spec-draft';
import { createModel, type Model } from '@/lib/schemas/model';

const SPECS: Model['specs'] = {
  'Pop-off pressure': { min: 21, max: 37, unit: 'psi', repeats: 2, maxSpread: { amount: 1, of: 'unit' } },
  Compression: { min: 110, unit: 'psi', maxDifference: { amount: 10, of: 'percent' } },
  'Plug gap': { target: 0.7 },
};

test('specs come out of the form as they went in', () => {
  expect(readSpecs(draftSpecs(SPECS))).toEqual({ specs: SPECS });
});

test('how far apart is an amount, or a percentage where the sign says so; a comma is a decimal point', () => {
  const [row] = draftSpecs({ Compression: { min: 110 } });
  const typed = { ...row!, maxSpread: '2,5', maxDifference: '12.5 %', repeats: '3' };
  expect(readSpecs([typed])).toEqual({
    specs: {
      Compression: {
        min: 110,
        repeats: 3,
        maxSpread: { amount: 2.5, of: 'unit' },
        maxDifference: { amount: 12.5, of: 'percent' },
      },
    },
  });
});

test('what is no number is refused at the field in which it was typed', () => {
  const [row] = draftSpecs({ Compression: { min: 110 } });
  const rows = [{ ...row!, maxDifference: 'a little' }];
  const read = readSpecs(rows);
  const engine = { propulsion: 'jet', stroke: 'two', engines: 1, cylinders: 2, carbCount: 2 };
  const parsed = createModel.safeParse({ name: 'Twin', ...engine, ...read });
  const paths = parsed.error!.issues.map(({ path }) => specPath(path.join('.'), rows));
  expect(paths).toEqual(['spec.0.maxDifference']);
});

test('a row filled in anywhere needs a name', () => {
  const [row] = draftSpecs({ Compression: {} });
  expect(readSpecs([{ ...row!, name: '', repeats: '2' }])).toEqual({
    errors: [{ path: 'spec.0.name', message: 'Name this spec, or empty its row.' }],
  });
});
