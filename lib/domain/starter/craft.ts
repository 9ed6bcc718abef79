import { caution, check, each, MANUAL_FIRST, measure, note, photo, type StarterProcedure } from './step';

const ROTATING = caution(
  'rotating',
  'Impellers and propellers cut',
  'Lanyard off, battery off and the key in your pocket before a hand goes into the intake, the grate or the nozzle.',
);

const JET: StarterProcedure = {
  name: 'Jet pump and impeller',
  kind: 'service',
  steps: [
    MANUAL_FIRST,
    ROTATING,
    check('grate', 'Intake grate whole, tight and clear of line and weed'),
    check('impeller', 'Impeller edges whole: no nick, bend or crack', {
      per: 'engine',
      onFail: { open: 'task', title: 'Impeller to be dressed or replaced', kind: 'repair', holdsUnit: true },
    }),
    measure(
      'clearance',
      'Widest clearance between impeller and wear ring',
      ['Impeller clearance', 'mm', ['found', 'left']],
      {
        per: 'engine',
        detail: 'With a feeler, at every blade; write the widest.',
      },
    ),
    check('bearing', 'Shaft turns smoothly, without play or water in the bearing', each('engine')),
    check('nozzle', 'Steering nozzle and reverse bucket move freely, bolts tight'),
    check('anode', 'Anodes more than half there'),
  ],
};

const CABLES: StarterProcedure = {
  name: 'Steering and throttle cables',
  kind: 'inspection',
  steps: [
    MANUAL_FIRST,
    ROTATING,
    check('steering', 'Steering turns fully both ways without catch or play', {
      onFail: { open: 'defect', title: 'Steering catches or has play', holdsUnit: true },
    }),
    check('straight', 'Nozzle or drive stands straight with the bars straight'),
    check('throttle', 'Throttle snaps back by itself from everywhere', {
      onFail: { open: 'defect', title: 'Throttle does not return', holdsUnit: true },
    }),
    check('reverse', 'Shift or reverse reaches both ends'),
    check('sheaths', 'No broken sheath, kink or rust; ends greased; boots whole'),
  ],
};

const LANYARD: StarterProcedure = {
  name: 'Cut-off lanyard and switch',
  kind: 'inspection',
  steps: [
    MANUAL_FIRST,
    check('lanyard', 'Lanyard whole, clips close, right one for the craft, a spare on board'),
    check('starts', 'Will not start with the lanyard off', {
      onFail: { open: 'defect', title: 'Starts without the lanyard', holdsUnit: true },
    }),
    check('stops', 'Stops at once when the lanyard is pulled', {
      detail: 'At idle, in the water or on the flush, and again from a third of throttle in the water.',
      caution: 'Exhaust holds carbon monoxide: outdoors only. Tie the craft fast.',
      onFail: { open: 'defect', title: 'Does not stop when the lanyard is pulled', holdsUnit: true },
    }),
    check('stop-button', 'Stop button stops the engine', {
      onFail: { open: 'defect', title: 'Stop button does not stop the engine', holdsUnit: true },
    }),
  ],
};

const SAFETY: StarterProcedure = {
  name: 'Fire extinguisher and safety gear',
  kind: 'inspection',
  steps: [
    MANUAL_FIRST,
    check('extinguisher', 'Extinguisher there, of the kind the law asks for, in date, gauge in the green', {
      onFail: { open: 'defect', title: 'Fire extinguisher missing or out of date', holdsUnit: true },
    }),
    check('bracket', 'Bracket holds it and lets it go'),
    check('whistle', 'Whistle or horn there and heard'),
    check('line', 'Tow line and, where the law asks, anchor on board'),
    check('papers', 'Registration on board, numbers on the hull readable'),
    check('labels', 'Warning labels readable'),
    note('until', 'Date the extinguisher is good until'),
  ],
};

const COMMISSIONING: StarterProcedure = {
  name: 'Pre-season commissioning',
  kind: 'service',
  steps: [
    MANUAL_FIRST,
    ROTATING,
    check('hull', 'Hull, seams, drain plugs and seat latches sound'),
    check('battery', 'Battery charged, strapped, poles tight'),
    check('fuel', 'Old fuel out, fresh fuel in, hoses and clamps tight', {
      caution: 'Petrol vapour gathers in the hull: air it, no flame, no spark.',
    }),
    check('oils', 'Oils at their marks, not milky'),
    check('plugs', 'Plugs out, fogging oil turned out, plugs in', {
      caution: 'Ground the leads before cranking.',
    }),
    check('cables', 'Steering, throttle and shift move freely'),
    check('lanyard', 'Lanyard stops the engine', {
      onFail: { open: 'defect', title: 'Does not stop when the lanyard is pulled', holdsUnit: true },
    }),
    check('flush', 'Runs on the flush, cooling water comes out', {
      detail:
        'Engine first, then water; water off first, then engine. Never dry for longer than the manual says.',
      caution: 'Exhaust holds carbon monoxide: outdoors only. Stay clear of the intake.',
    }),
    check('gear', 'Extinguisher, whistle, line and papers on board'),
    photo('ready', 'Picture of the craft as it goes to the dock'),
  ],
};

const LAY_UP: StarterProcedure = {
  name: 'Winter lay-up',
  kind: 'service',
  steps: [
    MANUAL_FIRST,
    ROTATING,
    check('flushed', 'Flushed with fresh water, outside washed, bilge dry'),
    check('stabiliser', 'Tank full with stabiliser, run through to the carburettors or injectors', {
      caution: 'Petrol vapour and carbon monoxide: outdoors, no flame.',
    }),
    check('fogged', 'Fogging oil in every cylinder, turned over', {
      per: 'cylinder',
      caution: 'Ground the leads before cranking.',
    }),
    check('drained', 'Cooling system drained or filled with antifreeze as the manual says', {
      detail: 'Water that freezes splits blocks and exhausts.',
    }),
    check('greased', 'Jet pump, cables and fittings greased'),
    check('battery', 'Battery out, charged, stored dry and charged again every month'),
    check('covered', 'Covered so that air comes through, intake closed against mice'),
    note('where', 'Where it stands and where its battery is'),
  ],
};

const TEST_RIDE: StarterProcedure = {
  name: 'Test ride after a rebuild',
  kind: 'inspection',
  steps: [
    MANUAL_FIRST,
    caution(
      'ride',
      'The craft is not proven yet',
      'Life jacket and lanyard on, clear water, within sight of the dock, somebody watching with a way to fetch you.',
    ),
    check('before', 'No leak, no smell, bilge dry, steering and throttle free'),
    check('idle', 'Starts warm and cold, idles steadily'),
    check('pick-up', 'Clean pick-up through the whole throttle range', {
      onFail: {
        open: 'task',
        title: 'Does not pick up cleanly after the rebuild',
        kind: 'repair',
        holdsUnit: true,
      },
    }),
    check('full', 'Reaches its revolutions at full throttle, no warning on the display'),
    measure('fine', 'Fine adjustment, turns from the setting', ['Fine adjustment', 'turns', ['left']], {
      per: 'carb',
      required: false,
      detail: 'Within a quarter turn either way; written as left, − for in.',
    }),
    check('after', 'Back at the dock: no leak, bilge dry, nothing loose'),
    note('words', 'What the rider says'),
  ],
};

export const CRAFT_PROCEDURES: readonly StarterProcedure[] = [
  JET,
  CABLES,
  LANYARD,
  SAFETY,
  COMMISSIONING,
  LAY_UP,
  TEST_RIDE,
];
