import type { Metadata } from 'next';
import { RuleTable } from '@/components/rules/RuleTable';
import { EmptyState } from '@/components/ui/EmptyState';
import { LinkButton } from '@/components/ui/LinkButton';
import { PageHeader } from '@/components/ui/PageHeader';
import { openRules } from '@/lib/actions/open-rules';
import { pageContext } from '@/lib/auth/page';

export const metadata: Metadata = { title: 'Rules' };

export default async function RulesPage({ searchParams }: { searchParams: Promise<{ ended?: string }> }) {
  const withEnded = (await searchParams).ended === 'include';
  const { rules, mayWrite } = await openRules(await pageContext(), withEnded ? { ended: 'include' } : {});
  const add = mayWrite ? (
    <LinkButton kind="primary" href="/rules/new">
      Write a rule
    </LinkButton>
  ) : null;
  return (
    <>
      <PageHeader
        title="Rules"
        lead="What is done to which units, how often, and what being late does."
        actions={add}
      />
      {rules.length === 0 ? (
        <EmptyState title="No rule yet" action={add}>
          A rule says which work recurs on which units. Until there is one, nothing comes due and nothing is
          held for being overdue.
        </EmptyState>
      ) : (
        <RuleTable rules={rules} />
      )}
      <p className="mt-6">
        <LinkButton kind="quiet" href={withEnded ? '/rules' : '/rules?ended=include'}>
          {withEnded ? 'Only rules in force' : 'Show ended rules too'}
        </LinkButton>
      </p>
    </>
  );
}
