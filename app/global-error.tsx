'use client';

import { Button } from '@/components/ui/Button';
import { PageHeader } from '@/components/ui/PageHeader';
import { fontClasses } from './fonts';
import './globals.css';

/** The last net: replaces the whole document when the root layout itself fails. */
export default function GlobalError({
  error,
  reset,
}: {
  error: Error & { digest?: string };
  reset: () => void;
}) {
  return (
    <html lang="en" className={fontClasses}>
      <body>
        <title>Something broke · Wakewright</title>
        <main className="mx-auto max-w-prose px-gutter py-8" role="alert">
          <PageHeader title="This screen could not be drawn" kicker="Wakewright" />
          <p className="mb-2 text-lg">
            Nothing you entered elsewhere was changed by this. Try again; if it keeps happening, tell your
            manager what you were doing.
          </p>
          {error.digest ? (
            <p className="mb-6 text-ink-soft">
              Reference: <span className="numerals">{error.digest}</span>
            </p>
          ) : null}
          <Button kind="primary" onClick={reset}>
            Try again
          </Button>
        </main>
      </body>
    </html>
  );
}
