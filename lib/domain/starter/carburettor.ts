import { caution, check, each, MANUAL_FIRST, measure, note, photo, type StarterProcedure } from './step';

const PETROL = caution(
  'petrol',
  'Petrol vapour',
  'It is heavier than air and gathers in the hull and under the bench. Air both, keep every flame, spark and hot engine away, and drain into a closed can.',
);
const SOLVENT =
  'Solvent spray and compressed air carry drops into eyes: wear goggles and gloves, blow away from yourself.';
const PRESSURE =
  'A fitting that lets go flies: stand aside, raise the pressure slowly and stay below what the gauge is made for.';
const fails = {
  when: [
    { step: 'pop-off', outcome: 'fail' as const },
    { step: 'needle-holds', outcome: 'fail' as const },
  ],
};

/** Of the carburettor that failed alone. */
const REBUILD_IT = {
  open: 'task' as const,
  kind: 'rebuild' as const,
  title: 'Carburettor rebuild',
  holdsUnit: true,
};

/** The test that decides whether needle, seat, lever and spring are touched at all. */
const POP_OFF = measure('pop-off', 'Pop-off test, wet', ['Pop-off pressure', 'psi', ['found', 'left']], {
  per: 'carb',
  detail:
    'Wet the seat with a little fuel. Raise the pressure slowly until the needle lifts, and read it. Do it two or three times: all runs must agree.',
  caution: PRESSURE,
  onFail: REBUILD_IT,
});
const HOLDS = check('needle-holds', 'The needle holds pressure', {
  per: 'carb',
  detail: 'Below the pop-off pressure, wet: the gauge stands still for ten seconds.',
  onFail: { open: 'defect', title: 'Inlet needle does not hold', holdsUnit: true },
});
const HOLDS_NOW = check('needle-holds-now', 'The needle holds pressure now', {
  per: 'carb',
  ...fails,
  retests: 'needle-holds',
  detail: 'As before, with the new needle and seat.',
  onFail: REBUILD_IT,
});
const SCREWS = [
  check('screw-heads', 'Mixture screws have whole heads and points', {
    per: 'carb',
    detail:
      'Look at needle and passage while the screw is out. A screw with a damaged head or point is replaced, never used again.',
  }),
  measure(
    'low-speed',
    'Low-speed screw, turns out from lightly seated',
    ['Low-speed screw', 'turns', ['found', 'left']],
    {
      per: 'carb',
      detail:
        'Count the turns in until it seats lightly, never tight: that is as found. Then set it out to the spec.',
    },
  ),
  measure(
    'high-speed',
    'High-speed screw, turns out from lightly seated',
    ['High-speed screw', 'turns', ['found', 'left']],
    {
      per: 'carb',
      detail: 'As the low-speed screw. 0 is lightly seated.',
    },
  ),
];

const INSPECTION: StarterProcedure = {
  name: 'Carburettor inspection',
  kind: 'inspection',
  steps: [
    MANUAL_FIRST,
    PETROL,
    check('air-filter', 'Flame arrester and air box are clean, dry and tight'),
    check('throttle', 'Throttle opens fully, closes by itself and has no play', each('carb')),
    check('choke', 'Choke or primer works and shuts off', each('carb')),
    check('fuel-lines', 'Fuel and pulse lines are soft, tight and without a crack', each('carb')),
    check('outside', 'No fuel or stain outside the body', {
      per: 'carb',
      onFail: { open: 'defect', title: 'Carburettor leaks fuel', holdsUnit: true },
    }),
    check('linkage', 'All throttles open together', { detail: 'With one carburettor this does not apply.' }),
    check('idle', 'Idles and picks up without a stumble', {
      detail: 'In the water or on the flush, with cooling water running.',
      caution:
        'Exhaust holds carbon monoxide: outdoors only. Hands, hair and lines stay away from the intake.',
    }),
    photo('picture', 'Picture of anything unusual'),
  ],
};

const REBUILD: StarterProcedure = {
  name: 'Carburettor rebuild',
  kind: 'rebuild',
  steps: [
    MANUAL_FIRST,
    PETROL,
    check('off', 'Battery off, fuel shut, carburettors off the engine and their ports covered'),
    photo('as-mounted', 'Picture of lines and linkage before they come off'),
    ...SCREWS.slice(1).map((step) => ({
      ...step,
      measures: { ...step.measures!, stages: ['found' as const] },
      key: `${step.key}-found`,
      title: `${step.title}, before it is taken out`,
    })),
    {
      ...POP_OFF,
      title: 'Pop-off test, wet, before anything is opened',
      measures: { ...POP_OFF.measures!, stages: ['found'] },
    },
    HOLDS,
    check('pump-apart', 'Fuel pump half taken apart', {
      per: 'carb',
      detail:
        'The fuel pump half before the metering half. Lay the parts down in the order they come off, and keep that order.',
    }),
    check('metering-apart', 'Metering half taken apart', {
      per: 'carb',
      detail:
        'Keep the order here too. Inlet needle, seat, lever and spring stay where they are: the pop-off test says whether they are touched.',
    }),
    check('rubber-off', 'Every rubber part is off the body', {
      per: 'carb',
      detail: 'Before solvent comes near: O-rings, diaphragms and check valves swell in it and are spoilt.',
    }),
    check('gaskets-off', 'Old gasket lifted, sealing faces unmarked', {
      per: 'carb',
      detail: 'Lift it with plastic or a fingernail. A scratch across a sealing face leaks for ever.',
    }),
    check('cleaned', 'Body and passages washed and blown through', {
      per: 'carb',
      detail: 'Blow every passage both ways and see that it comes out where it should.',
      caution: SOLVENT,
    }),
    check('filter', 'Filter screen renewed', each('carb')),
    SCREWS[0]!,
    check('needle-set', 'Inlet needle, seat and spring renewed, lever set', {
      per: 'carb',
      ...fails,
      detail:
        'Only where the pop-off test failed or the needle did not hold. Set the lever to the height of the maker’s manual.',
    }),
    check('kit-in', 'All that the kit holds is in: gaskets, diaphragms, check valves, O-rings', {
      per: 'carb',
      detail: 'Everything the kit holds is renewed, also what still looks good.',
    }),
    check('together', 'Metering half, then pump half, closed in order, screws crosswise', each('carb')),
    measure(
      'pop-off-closed',
      'Pop-off test, wet, of the closed carburettor',
      ['Pop-off pressure', 'psi', ['left']],
      {
        per: 'carb',
        detail: 'Two or three runs that agree.',
        caution: PRESSURE,
        onFail: REBUILD_IT,
      },
    ),
    HOLDS_NOW,
    ...SCREWS.slice(1).map((step) => ({
      ...step,
      measures: { ...step.measures!, stages: ['left' as const] },
    })),
    check('fitted', 'Carburettors on with new mounting gaskets, lines and linkage as in the picture'),
    check('leaks', 'Fuel on: no leak at any joint', {
      caution: 'Look and smell before the battery goes on. Air the hull.',
      onFail: { open: 'defect', title: 'Fuel leak after carburettor work', holdsUnit: true },
    }),
    note('found', 'What was found, for whoever opens it next', { per: 'carb' }),
  ],
  follows: {
    'pop-off': 'Carburettor rebuild',
    'pop-off-closed': 'Carburettor rebuild',
    'needle-holds-now': 'Carburettor rebuild',
  },
};

const POP_OFF_TEST: StarterProcedure = {
  name: 'Pop-off test',
  kind: 'inspection',
  steps: [
    MANUAL_FIRST,
    PETROL,
    POP_OFF,
    HOLDS,
    check('needle-set', 'Inlet needle, seat and spring renewed, lever set', {
      per: 'carb',
      ...fails,
      detail:
        'Only where the test failed or the needle did not hold; else they are left alone. Then test again: that is as left.',
    }),
    HOLDS_NOW,
  ],
  follows: { 'pop-off': 'Carburettor rebuild', 'needle-holds-now': 'Carburettor rebuild' },
};

const MIXTURE: StarterProcedure = {
  name: 'Mixture setting',
  kind: 'service',
  steps: [
    MANUAL_FIRST,
    ...SCREWS,
    check('warm', 'Engine warm, in the water, craft tied fast', {
      caution: 'Exhaust holds carbon monoxide: outdoors only. Keep clear of the intake and the jet.',
    }),
    check('pick-up', 'Clean pick-up from idle through the whole throttle range'),
    measure(
      'fine',
      'Fine adjustment made on the water, turns from the setting',
      ['Fine adjustment', 'turns', ['left']],
      {
        per: 'carb',
        detail:
          'A quarter turn either way at most; write what it is left at, − for in. More than that has another cause: look for it.',
      },
    ),
  ],
};

export const CARBURETTOR_PROCEDURES: readonly StarterProcedure[] = [
  INSPECTION,
  REBUILD,
  POP_OFF_TEST,
  MIXTURE,
];
