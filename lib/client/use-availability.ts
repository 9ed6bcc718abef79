'use client';

import { useQuery } from '@tanstack/react-query';
import type { Availability } from '@/lib/schemas/availability';
import { send, type Failure } from './api';

/** What availability is asked about; a part left out is not asked. */
export type AvailabilityAsked = { dockId?: string; on?: string; hours?: string };

const EVERY_MS = 1_000;

/**
 * Availability as the server has it, asked again every second while the page is seen. `first` is what the page came
 * with, for the question it came with. A failed answer leaves the last one in place and is told beside it.
 */
export function useAvailability(
  asked: AvailabilityAsked,
  first?: Availability,
): { data: Availability | undefined; failure: Failure | null } {
  const search = new URLSearchParams(Object.entries(asked).filter(([, value]) => value)).toString();
  const { data, error } = useQuery<Availability, Failure>({
    queryKey: ['availability', search],
    queryFn: async () => {
      const answer = await send<Availability>('GET', `/api/v1/availability${search && `?${search}`}`);
      if (!answer.ok) throw answer;
      return answer.data;
    },
    initialData: first,
    initialDataUpdatedAt: 0,
    placeholderData: (before) => before,
    refetchInterval: EVERY_MS,
    retry: false,
    networkMode: 'always',
  });
  return { data, failure: error };
}
