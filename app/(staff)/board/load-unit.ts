import { cache } from 'react';
import { notFound } from 'next/navigation';
import { getUnitReadiness } from '@/lib/actions/get-unit-readiness';
import { pageContext } from '@/lib/auth/page';
import { orNotFound } from '@/lib/auth/page-row';
import { id } from '@/lib/schemas/common';

/** The unit of a page's address as it stands now; the page does not exist when there is none, or none at one's docks. */
export const loadUnit = cache(async (unitId: string) => {
  const parsed = id.safeParse(unitId);
  return parsed.success ? orNotFound(getUnitReadiness(await pageContext(), parsed.data)) : notFound();
});
