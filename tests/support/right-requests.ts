import { randomUUID } from 'node:crypto';
import type { Role } from '@/lib/domain/access';
import type { RightRequest, World } from './requests';

const EVERYONE: readonly Role[] = ['manager', 'mechanic', 'dock'];
const WORKSHOP: readonly Role[] = ['manager', 'mechanic'];
const MANAGER: readonly Role[] = ['manager'];
const refused = { elsewhere: 'refused' } as const;

/** A right request for every operation that wants signing in, by its id. */
export function rightRequests(world: World): Record<string, RightRequest> {
  return {
    ...ofFleet(world),
    ...ofUnits(world),
    ...ofDockside(world),
    ...ofWork(world),
    ...ofWorkshop(world),
    ...ofParts(world),
    ...ofFiles(world),
    ...ofOffice(world),
  };
}

function ofFleet({ home }: World): Record<string, RightRequest> {
  const dock = { id: home.dock.id };
  const model = { id: home.model.id };
  const engine = { propulsion: 'jet', stroke: 'two', engines: 1, cylinders: 2, carbCount: 2 };
  const season = { from: '05-01', to: '09-30' };
  return {
    listDocks: { roles: EVERYONE },
    createDock: {
      body: {
        name: 'Cais Novo',
        timeZone: 'Europe/Lisbon',
        season,
        openWeekdays: ['SA'],
        craftNumbers: 'us',
      },
      roles: MANAGER,
      ...refused,
    },
    getDock: { params: dock, roles: EVERYONE, ...refused },
    changeDock: { params: dock, body: { name: 'Cais Velho', season }, roles: MANAGER, ...refused },
    listModels: { roles: EVERYONE },
    createModel: {
      body: { name: 'Quad', ...engine, specs: { Compression: { min: 150, max: 180, unit: 'psi' } } },
      roles: MANAGER,
      ...refused,
    },
    getModel: { params: model, roles: EVERYONE },
    changeModel: { params: model, body: { name: 'Twin, later', ...engine }, roles: MANAGER, ...refused },
  };
}

function ofUnits({ home, unitId, retireId, baselineId }: World): Record<string, RightRequest> {
  const unit = { id: unitId };
  const named = { fleetNumber: 'N-9', modelId: home.model.id, dockId: home.dock.id };
  const ruleId = home.rule!.id;
  return {
    listUnits: { query: { dockId: home.dock.id }, roles: EVERYONE, ...refused },
    createUnit: {
      body: {
        ...named,
        hin: 'ABC12345D404',
        registration: 'NH 1234 BD',
        enteredServiceOn: '2026-05-01',
        engineHours: 12.5,
        outings: 3,
        carbCount: 2,
      },
      roles: MANAGER,
      ...refused,
    },
    getUnit: { params: unit, roles: EVERYONE, ...refused },
    changeUnit: {
      params: { id: retireId },
      body: { fleetNumber: 'N-4b', enteredServiceOn: '2026-04-01' },
      roles: MANAGER,
      ...refused,
    },
    getUnitReadiness: { params: unit, roles: EVERYONE, ...refused },
    listDuePoints: { params: unit, roles: EVERYONE, ...refused },
    listHistory: { params: unit, query: { kind: 'reading', limit: '5' }, roles: EVERYONE, ...refused },
    listBaselines: { params: unit, roles: EVERYONE, ...refused },
    recordBaseline: {
      params: unit,
      body: { ruleId, closedOn: '2026-05-01', engineHours: 95, outings: 0, note: 'An invoice' },
      roles: WORKSHOP,
      ...refused,
    },
    withdrawBaseline: { params: { id: unitId, baselineId }, roles: MANAGER, ...refused },
    listClosings: { params: unit, query: { ruleId }, roles: EVERYONE, ...refused },
  };
}

function ofDockside(world: World): Record<string, RightRequest> {
  const { home, unitId, outingUnitId } = world;
  return {
    getAvailability: {
      query: { dockId: home.dock.id, on: '2099-12-24', hours: '1.5' },
      roles: EVERYONE,
      ...refused,
    },
    checkOut: {
      body: { id: randomUUID(), unitId: outingUnitId, plannedHours: 1, renterReference: 'A-17' },
      roles: EVERYONE,
      ...refused,
    },
    checkIn: {
      body: {
        id: randomUUID(),
        unitId: outingUnitId,
        hours: 10.1,
        defect: { title: 'Loose grip', holdsUnit: false },
      },
      roles: EVERYONE,
      ...refused,
    },
    listReadings: { query: { unitId }, roles: EVERYONE, ...refused },
    logReading: { body: { id: randomUUID(), unitId, hours: 101.2 }, roles: EVERYONE, ...refused },
    voidReading: {
      params: { id: world.reading },
      body: { reason: 'Of the wrong craft', replacement: { hours: 101.1 } },
      roles: WORKSHOP,
      ...refused,
    },
    reviewReading: {
      params: { id: world.toReview },
      body: { note: 'It is right' },
      roles: MANAGER,
      ...refused,
    },
    listDefects: { query: { unitId, open: 'true' }, roles: EVERYONE, ...refused },
    reportDefect: {
      body: { id: randomUUID(), unitId, title: 'Smell of petrol', detail: 'At the stern', holdsUnit: true },
      roles: EVERYONE,
      ...refused,
    },
    clearDefect: { params: { id: world.defectId }, body: { note: 'Sealed' }, roles: WORKSHOP, ...refused },
    listLayUps: { query: { unitId, open: 'true' }, roles: EVERYONE, ...refused },
    recordLayUp: {
      body: { unitId, fromOn: '2027-01-01', untilOn: '2027-02-01', reason: 'Paint' },
      roles: WORKSHOP,
      ...refused,
    },
    endLayUp: { params: { id: world.layUpId }, roles: WORKSHOP, ...refused },
  };
}

function ofWork(world: World): Record<string, RightRequest> {
  const { home, unitId, taskId } = world;
  const task = { id: taskId };
  const ruleId = { id: home.rule!.id };
  const triggers = [{ on: 'engine_hours', every: 50, anchor: 'completed' }];
  const rule = { name: 'Wear ring', kind: 'service', appliesTo: { dockIds: [home.dock.id] }, triggers };
  const standing = { enteredServiceOn: '2026-05-01', engineHours: 100, outings: 4 };
  return {
    listRules: { query: { ended: 'include' }, roles: EVERYONE },
    createRule: { body: { ...rule, lead: { hours: 5 }, holdsUnit: true }, roles: MANAGER, ...refused },
    previewRule: { body: { triggers, unit: standing, today: '2026-06-01', count: 2 }, roles: EVERYONE },
    getRule: { params: ruleId, roles: EVERYONE },
    changeRule: { params: ruleId, body: { ...rule, name: 'Wear ring, later' }, roles: MANAGER, ...refused },
    endRule: { params: ruleId, body: { reason: 'Not wanted' }, roles: MANAGER, ...refused },
    reopenRule: { params: ruleId, roles: MANAGER, ...refused },
    listTasks: { query: { dockId: home.dock.id, state: 'all' }, roles: EVERYONE, ...refused },
    openTask: {
      body: { unitId, kind: 'repair', title: 'Torn seat', plannedOn: '2027-01-04', holdsUnit: false },
      roles: WORKSHOP,
      ...refused,
    },
    getTask: { params: task, roles: EVERYONE, ...refused },
    changeTask: {
      params: task,
      body: { started: true, plannedOn: '2027-01-04' },
      roles: WORKSHOP,
      ...refused,
    },
    addTaskNote: { params: task, body: { text: 'Waits for resin' }, roles: WORKSHOP, ...refused },
    closeTask: { params: task, body: { minutes: 30, note: 'Done' }, roles: WORKSHOP, ...refused },
    withdrawTask: {
      params: { id: world.spareTaskId },
      body: { reason: 'Twice the same' },
      roles: WORKSHOP,
      ...refused,
    },
    reverseClosure: {
      params: { id: world.closureId },
      body: { reason: 'It was another craft' },
      roles: MANAGER,
      ...refused,
    },
    getCalendar: {
      query: { from: '2026-12-01', to: '2026-12-31', dockId: home.dock.id },
      roles: EVERYONE,
      ...refused,
    },
  };
}

function ofWorkshop(world: World): Record<string, RightRequest> {
  const steps = [
    { key: 'test', kind: 'check', title: 'It holds', per: 'carb', required: true },
    { key: 'mend', kind: 'note', title: 'What was done', when: [{ step: 'test', outcome: 'fail' }] },
  ];
  const { procedureId, spareProcedureId, signOffId } = world;
  const bench = { id: world.benchTaskId };
  const procedure = { name: 'Leak test', kind: 'inspection', steps, note: 'First go' };
  return {
    listProcedures: { roles: EVERYONE },
    createProcedure: { body: procedure, roles: WORKSHOP, ...refused },
    getProcedure: { params: { id: procedureId }, roles: EVERYONE },
    changeProcedure: {
      params: { id: procedureId },
      body: { ...procedure, name: 'Leak test, later' },
      roles: WORKSHOP,
      ...refused,
    },
    retireProcedure: { params: { id: spareProcedureId }, roles: WORKSHOP, ...refused },
    getWork: { params: bench, roles: EVERYONE, ...refused },
    recordEntry: {
      params: bench,
      body: { id: randomUUID(), stepKey: 'look', place: 0, value: { kind: 'check', outcome: 'fail' } },
      roles: WORKSHOP,
      ...refused,
    },
    seeAtTask: { params: bench, roles: WORKSHOP, ...refused },
    openFollowUp: {
      params: bench,
      body: { id: randomUUID(), stepKey: 'look', place: 0 },
      roles: WORKSHOP,
      ...refused,
    },
    signOffTask: {
      params: { id: world.openTaskId },
      body: { id: randomUUID(), kind: 'second_person', note: 'All of it looked at' },
      roles: WORKSHOP,
      ...refused,
    },
    listMeasurements: { params: { id: world.unitId }, roles: EVERYONE, ...refused },
    getServiceRecord: { params: { id: world.closureId }, roles: EVERYONE, ...refused },
    withdrawSignOff: { params: { ...bench, signOffId }, roles: WORKSHOP, ...refused },
  };
}

function ofParts(world: World): Record<string, RightRequest> {
  const { home, partId, kitId } = world;
  const part = { params: { id: partId }, roles: WORKSHOP, ...refused };
  const task = { params: { id: world.openTaskId }, roles: WORKSHOP, ...refused };
  return {
    listParts: { query: { dockId: home.dock.id, low: 'false' }, roles: EVERYONE, ...refused },
    createPart: {
      body: {
        ...{ id: randomUUID(), number: 'K-9', name: 'Fuel kit', supplier: 'The chandler' },
        contents: [{ partId, quantity: 2 }],
      },
      roles: WORKSHOP,
      ...refused,
    },
    getPart: { params: { id: kitId }, roles: EVERYONE },
    changePart: { ...part, body: { name: 'Gasket, thin', supplier: null } },
    retirePart: { params: { id: world.sparePartId }, roles: WORKSHOP, ...refused },
    markLow: { ...part, body: { dockId: home.dock.id, lowAt: 4 } },
    listStock: { query: { dockId: home.dock.id, low: 'true' }, roles: EVERYONE, ...refused },
    listStockMoves: { query: { partId, dockId: home.dock.id, limit: '5' }, roles: EVERYONE, ...refused },
    recordStockMove: {
      body: { kind: 'make_up', id: randomUUID(), partId: kitId, dockId: home.dock.id, quantity: 1 },
      roles: WORKSHOP,
      ...refused,
    },
    getTaskParts: { params: { id: world.openTaskId }, roles: EVERYONE, ...refused },
    sayNeed: { ...task, body: { partId, quantity: 3 } },
    reserveParts: task,
    setReservation: { ...task, body: { partId, quantity: 2, dockId: home.dock.id } },
    releaseParts: task,
  };
}

function ofFiles({ attachmentId, unitId, taskId }: World): Record<string, RightRequest> {
  const params = { id: attachmentId };
  return {
    listAttachments: { query: { unitId }, roles: EVERYONE, ...refused },
    addAttachment: {
      query: { id: randomUUID(), unitId, taskId, name: 'hatch.jpg' },
      roles: EVERYONE,
      ...refused,
    },
    readAttachment: { params, roles: EVERYONE, ...refused },
    readAttachmentThumb: { params, roles: EVERYONE, ...refused },
    removeAttachment: { params, roles: WORKSHOP, ...refused },
    restoreAttachment: { params, roles: WORKSHOP, ...refused },
  };
}

function ofOffice(world: World): Record<string, RightRequest> {
  const person = { id: world.personId };
  const newcomer = { name: 'Kit Loe', email: 'kit@wakewright.example', role: 'dock', dockIds: [] };
  const password = 'otters-under-the-jetty';
  return {
    getAccount: { roles: EVERYONE },
    changeAccount: { body: { name: 'Ines Marlow', digestWanted: true }, roles: EVERYONE },
    changePassword: { body: { currentPassword: 'no password yet', newPassword: password }, roles: EVERYONE },
    endOwnSessions: { roles: EVERYONE },
    listApiKeys: { roles: EVERYONE },
    createApiKey: { body: { name: 'Another till' }, roles: MANAGER },
    revokeApiKey: { params: { id: world.apiKeyId }, roles: EVERYONE },
    listPeople: { roles: MANAGER, ...refused },
    createPerson: { body: { ...newcomer, password }, roles: MANAGER, ...refused },
    getPerson: { params: person, roles: MANAGER, ...refused },
    changePerson: { params: person, body: { name: 'Ada Reef', role: 'dock' }, roles: MANAGER, ...refused },
    deactivatePerson: { params: person, roles: MANAGER, ...refused },
    reactivatePerson: { params: person, roles: MANAGER, ...refused },
    listInvitations: { roles: MANAGER, ...refused },
    invitePerson: { body: { ...newcomer, email: 'bo@wakewright.example' }, roles: MANAGER, ...refused },
    resendInvitation: { params: { id: world.invitationId }, roles: MANAGER, ...refused },
    withdrawInvitation: { params: { id: world.invitationId }, roles: MANAGER, ...refused },
    previewDigest: { query: { weekOn: '2026-11-23' }, roles: MANAGER },
    sendDigestNow: { roles: MANAGER },
  };
}
