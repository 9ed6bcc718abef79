import { caution, check, each, MANUAL_FIRST, measure, note, type StarterProcedure } from './step';

const COMPRESSION: StarterProcedure = {
  name: 'Compression test',
  kind: 'inspection',
  steps: [
    MANUAL_FIRST,
    caution(
      'sparks',
      'Loose plug leads spark',
      'Ground every lead to the engine, or the ignition is spoilt and vapour in the hull may catch fire.',
    ),
    check('ready', 'Engine warm, all plugs out, leads grounded, throttle fully open'),
    measure(
      'compression',
      'Compression, cranked until the gauge stands still',
      ['Compression', 'psi', ['found']],
      {
        per: 'cylinder',
        detail:
          'The same number of turns for each. How far cylinders may differ is a spec of the model: 10 % is common, some makers allow 15 %.',
        onFail: { open: 'defect', title: 'Compression out of limits', holdsUnit: true },
      },
    ),
    note('wet', 'With a spoon of oil in a low cylinder: what it then shows', each('cylinder')),
  ],
};

const PLUGS: StarterProcedure = {
  name: 'Spark plugs',
  kind: 'service',
  steps: [
    MANUAL_FIRST,
    check('colour', 'The old plug is dry and evenly tan', {
      per: 'cylinder',
      detail: 'Wet, sooty, white or with metal on it: it says how that cylinder runs. Write it down below.',
    }),
    note('seen', 'What the plug looked like', each('cylinder')),
    measure('gap', 'Gap of the plug that goes in', ['Spark plug gap', 'mm', ['left']], each('cylinder')),
    check(
      'in',
      'Thread clean, plug run in by hand, tightened to the maker’s torque, lead pushed home',
      each('cylinder'),
    ),
  ],
};

const FUEL: StarterProcedure = {
  name: 'Fuel hoses, filter and tank',
  kind: 'inspection',
  steps: [
    MANUAL_FIRST,
    caution(
      'petrol',
      'Petrol vapour',
      'Air the hull, no flame, no spark, battery off. Drain into a closed can.',
    ),
    check('hoses', 'Hoses soft, dry, clamped and clear of hot and moving parts', {
      onFail: { open: 'defect', title: 'Fuel hose to be renewed', holdsUnit: true },
    }),
    check('filter', 'Fuel filter and water separator renewed or clean'),
    check('tank', 'Tank clean and without water, cap seals, vent breathes both ways'),
    check('selector', 'Fuel tap turns and shuts off'),
    check('leaks', 'Fuel on: no leak and no smell after five minutes', {
      onFail: { open: 'defect', title: 'Fuel leak', holdsUnit: true },
    }),
  ],
};

const BATTERY: StarterProcedure = {
  name: 'Battery and charging check',
  kind: 'service',
  steps: [
    MANUAL_FIRST,
    caution(
      'acid',
      'Acid and hydrogen',
      'Goggles on, no flame or spark. Off: minus first. On: minus last. No tool across the poles.',
    ),
    check('held', 'Battery strapped down, poles clean, tight and covered'),
    measure('rest', 'Voltage at rest', ['Battery at rest', 'V', ['found', 'left']], {
      detail: 'An hour or more after charging or running.',
    }),
    measure('charging', 'Voltage with the engine running', ['Charging voltage', 'V', ['found']], {
      required: false,
      detail: 'In the water or on the flush, above idle. An electric craft has its maker’s own check.',
      caution: 'Exhaust holds carbon monoxide: outdoors only. Keep clear of the intake.',
    }),
    check('vent', 'Vent hose on and clear'),
  ],
};

export const ENGINE_PROCEDURES: readonly StarterProcedure[] = [COMPRESSION, PLUGS, FUEL, BATTERY];
