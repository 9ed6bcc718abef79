import { redirect } from 'next/navigation';
import { homeFor } from '@/components/shell/destinations';
import { requirePerson } from '@/lib/auth/page';

/** Home is each role's own first screen. */
export default async function HomePage() {
  redirect(homeFor((await requirePerson()).role));
}
