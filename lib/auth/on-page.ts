import { notFound } from 'next/navigation';
import { Refusal } from '@/lib/errors';

/**
 * Awaits what a page cannot do without. A refusal becomes the page that says so: what is not there, and what one
 * may not see, are both shown as "not found", so that an address tells nobody whether there is something behind it.
 */
export async function onPage<T>(work: Promise<T>): Promise<T> {
  try {
    return await work;
  } catch (error) {
    if (error instanceof Refusal && ['not_found', 'forbidden', 'invalid_input'].includes(error.code))
      notFound();
    throw error;
  }
}
