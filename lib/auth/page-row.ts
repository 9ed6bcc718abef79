import { notFound } from 'next/navigation';
import { Refusal } from '@/lib/errors';
import { idParams } from '@/lib/schemas/common';

/** The id in the page's address; the page does not exist when it is no id. */
export async function pageId(params: Promise<{ id: string }>): Promise<string> {
  const parsed = idParams.safeParse(await params);
  return parsed.success ? parsed.data.id : notFound();
}

/**
 * Awaits what a page cannot do without. What is not there and what one may not see are both shown as "not found",
 * so that an address tells nobody whether there is something behind it.
 */
export async function orNotFound<T>(answer: Promise<T>): Promise<T> {
  try {
    return await answer;
  } catch (error) {
    if (error instanceof Refusal && ['not_found', 'forbidden', 'invalid_input'].includes(error.code))
      notFound();
    throw error;
  }
}
