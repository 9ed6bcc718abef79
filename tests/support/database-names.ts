/** Migrated and empty. */
export const TEMPLATE = 'wakewright_template';
/** Migrated, with the demo fleet. */
export const DEMO = 'wakewright_demo';
