import { CARBURETTOR_PROCEDURES } from './carburettor';
import { CRAFT_PROCEDURES } from './craft';
import { ENGINE_PROCEDURES } from './engine';
import type { StarterProcedure } from './step';

/** What every operator begins with. The limits that measurements are judged by stand on the models, not here. */
export const STARTER_PROCEDURES: readonly StarterProcedure[] = [
  ...CARBURETTOR_PROCEDURES,
  ...ENGINE_PROCEDURES,
  ...CRAFT_PROCEDURES,
];
