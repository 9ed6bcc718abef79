import type { Operation } from './operation';
import { DOCKSIDE_OPERATIONS } from './operations-dockside';
import { FILES_OPERATIONS } from './operations-files';
import { FLEET_OPERATIONS } from './operations-fleet';
import { OFFICE_OPERATIONS } from './operations-office';
import { PARTS_OPERATIONS } from './operations-parts';
import { SERVER_OPERATIONS } from './operations-server';
import { WORK_OPERATIONS } from './operations-work';
import { WORKSHOP_OPERATIONS } from './operations-workshop';

/** Every operation of the API: the OpenAPI document is made from these, and the routes are held to them. */
export const OPERATIONS: readonly Operation[] = [
  ...FLEET_OPERATIONS,
  ...DOCKSIDE_OPERATIONS,
  ...WORK_OPERATIONS,
  ...WORKSHOP_OPERATIONS,
  ...PARTS_OPERATIONS,
  ...FILES_OPERATIONS,
  ...OFFICE_OPERATIONS,
  ...SERVER_OPERATIONS,
];
