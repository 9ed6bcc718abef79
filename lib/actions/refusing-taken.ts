import { refuseField } from '@/lib/errors';

/**
 * Runs a write; when it breaks one of the named unique indexes, throws `conflict` for that field instead.
 * `indexes` maps an index's name to the field's path and the sentence.
 */
export async function refusingTaken<T>(
  indexes: Record<string, [path: string, message: string]>,
  write: () => Promise<T>,
): Promise<T> {
  try {
    return await write();
  } catch (error) {
    const { code, constraint } = error as { code?: string; constraint?: string };
    const taken = code === '23505' && constraint ? indexes[constraint] : undefined;
    if (!taken) throw error;
    throw refuseField(taken[0], taken[1], 'conflict');
  }
}

/** Two rules in force never share a name. */
export const RULE_NAME: Record<string, [path: string, message: string]> = {
  rule_name: ['name', 'A rule has that name already.'],
};
