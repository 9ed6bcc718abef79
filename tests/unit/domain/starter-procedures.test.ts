import { describe, expect, test } from 'vitest';
import type { Step } from '@/lib/domain/procedure';
import { STARTER_PROCEDURES } from '@/lib/domain/starter/procedures';
import { createProcedure } from '@/lib/schemas/procedure';

const stepsOf = (name: string): Step[] =>
  STARTER_PROCEDURES.find((procedure) => procedure.name === name)!.steps;
const place = (name: string, key: string) => stepsOf(name).findIndex((step) => step.key === key);

test('there is one for each job of the trade, under a name of its own', () => {
  expect(STARTER_PROCEDURES.map(({ name }) => name).sort()).toEqual([
    'Battery and charging check',
    'Carburettor inspection',
    'Carburettor rebuild',
    'Compression test',
    'Cut-off lanyard and switch',
    'Fire extinguisher and safety gear',
    'Fuel hoses, filter and tank',
    'Jet pump and impeller',
    'Mixture setting',
    'Pop-off test',
    'Pre-season commissioning',
    'Spark plugs',
    'Steering and throttle cables',
    'Test ride after a rebuild',
    'Winter lay-up',
  ]);
});

test.each(STARTER_PROCEDURES.map((procedure) => [procedure.name, procedure] as const))(
  '%s is a procedure that a person could have written, and puts the maker’s manual first',
  (_, { follows = {}, ...procedure }) => {
    expect(createProcedure.parse(procedure)).toEqual(procedure);
    for (const [key, name] of Object.entries(follows)) {
      expect(procedure.steps.find((step) => step.key === key)?.onFail?.open).toBe('task');
      expect(stepsOf(name).length).toBeGreaterThan(0);
    }
    expect(procedure.steps[0]).toMatchObject({
      kind: 'caution',
      title: expect.stringMatching(/manual comes first/) as string,
    });
  },
);

// The order and the dependency that those who rebuild diaphragm carburettors keep; no published source.
describe('a carburettor rebuild', () => {
  const rebuild = 'Carburettor rebuild';

  test('takes the fuel pump half apart before the metering half, and rubber off before solvent', () => {
    const order = ['pop-off', 'pump-apart', 'metering-apart', 'rubber-off', 'cleaned', 'kit-in'];
    const places = order.map((key) => place(rebuild, key));
    expect(places).toEqual([...places].sort((a, b) => a - b));
    expect(places).not.toContain(-1);
  });

  test('touches needle, seat, lever and spring only where the pop-off test failed or the needle did not hold', () => {
    for (const name of [rebuild, 'Pop-off test'])
      expect(stepsOf(name).find(({ key }) => key === 'needle-set')?.when).toEqual([
        { step: 'pop-off', outcome: 'fail' },
        { step: 'needle-holds', outcome: 'fail' },
      ]);
  });

  test('measures the pop-off pressure before it is opened and after it is closed, for each carburettor', () => {
    const measured = stepsOf(rebuild).filter(({ measures }) => measures?.spec === 'Pop-off pressure');
    expect(measured.map(({ per, measures }) => [per, measures!.stages])).toEqual([
      ['carb', ['found']],
      ['carb', ['left']],
    ]);
  });
});
