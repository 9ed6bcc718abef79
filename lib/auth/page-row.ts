import { notFound } from 'next/navigation';
import { Refusal } from '@/lib/errors';
import { idParams } from '@/lib/schemas/common';

/** The id in the page's address; the page does not exist when it is no id. */
export async function pageId(params: Promise<{ id: string }>): Promise<string> {
  const parsed = idParams.safeParse(await params);
  return parsed.success ? parsed.data.id : notFound();
}

/** What an action answers; the page does not exist for whoever may not see its row, or when there is none. */
export async function orNotFound<T>(answer: Promise<T>): Promise<T> {
  try {
    return await answer;
  } catch (error) {
    if (error instanceof Refusal && (error.code === 'not_found' || error.code === 'forbidden')) notFound();
    throw error;
  }
}
