import type { Metadata } from 'next';
import { cache } from 'react';
import { BenchSheet } from '@/components/procedures/BenchSheet';
import { RetireProcedure } from '@/components/procedures/RetireProcedure';
import { kindWords } from '@/components/task/task-words';
import { LinkButton } from '@/components/ui/LinkButton';
import { Notice } from '@/components/ui/Notice';
import { PageHeader } from '@/components/ui/PageHeader';
import { getProcedure } from '@/lib/actions/get-procedure';
import { mayFleetWide } from '@/lib/auth/may';
import { pageContext } from '@/lib/auth/page';
import { orNotFound, pageId } from '@/lib/auth/page-row';

type Props = { params: Promise<{ id: string }> };

const load = cache(async (id: string) => orNotFound(getProcedure(await pageContext(), id)));

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  return { title: (await load(await pageId(params))).name };
}

export default async function ProcedurePage({ params }: Props) {
  const ctx = await pageContext();
  const procedure = await load(await pageId(params));
  return (
    <>
      <PageHeader
        kicker={`${kindWords[procedure.kind]} · version ${procedure.version}`}
        title={procedure.name}
        actions={
          <>
            {mayFleetWide(ctx, 'procedure.write') && !procedure.retiredAt ? (
              <>
                <LinkButton kind="primary" href={`/procedures/${procedure.id}/edit`}>
                  Change
                </LinkButton>
                <RetireProcedure procedure={procedure} />
              </>
            ) : null}
            <LinkButton href="/procedures">All procedures</LinkButton>
          </>
        }
      />
      {procedure.retiredAt ? (
        <Notice tone="warn" title="Retired" still>
          No rule and no new task can follow it. Tasks opened under it keep it.
        </Notice>
      ) : null}
      <div className="grid gap-x-12 gap-y-8 lg:grid-cols-[3fr_1fr]">
        <section aria-label="Steps">
          <BenchSheet steps={procedure.steps} />
        </section>
        <section aria-labelledby="versions" className="no-print content-start">
          <h2 id="versions" className="text-2xl">
            Versions
          </h2>
          <p className="mb-3 text-ink-soft">The latest first; none is ever edited.</p>
          <ol className="grid">
            {procedure.versions.map(({ version, note, changes, writtenAt, writtenBy }) => (
              <li key={version} className="grid gap-1 border-t border-hairline py-3">
                <strong>Version {version}</strong>
                {note ? <span>{note}</span> : null}
                {changes.length > 0 ? (
                  <details>
                    <summary className="inline-flex min-h-target cursor-pointer items-center text-line underline underline-offset-4">
                      What changed ({changes.length})
                    </summary>
                    <ul className="grid gap-1">
                      {changes.map((change) => (
                        <li key={change}>{change}</li>
                      ))}
                    </ul>
                  </details>
                ) : null}
                <span className="text-ink-soft">
                  {writtenBy?.name ?? 'Shipped with Wakewright'},{' '}
                  <time dateTime={writtenAt}>{writtenAt.slice(0, 10)}</time>
                </span>
              </li>
            ))}
          </ol>
        </section>
      </div>
    </>
  );
}
