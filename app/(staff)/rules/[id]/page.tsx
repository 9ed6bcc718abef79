import type { Metadata } from 'next';
import { cache } from 'react';
import { EndRule } from '@/components/rules/EndRule';
import { RuleForm } from '@/components/rules/RuleForm';
import { Notice } from '@/components/ui/Notice';
import { PageHeader } from '@/components/ui/PageHeader';
import { openRuleForm } from '@/lib/actions/open-rule-form';
import { pageContext } from '@/lib/auth/page';
import { orNotFound, pageId } from '@/lib/auth/page-row';

type Props = { params: Promise<{ id: string }> };

const load = cache(async (id: string) => orNotFound(openRuleForm(await pageContext(), id)));

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const { rule } = await load(await pageId(params));
  return { title: rule?.name ?? 'Rule' };
}

export default async function RulePage({ params }: Props) {
  const data = await load(await pageId(params));
  const { rule, mayWrite } = data;
  if (!rule) return null;
  return (
    <>
      <PageHeader kicker="Rules" title={rule.name} actions={mayWrite ? <EndRule rule={rule} /> : null} />
      {rule.endedAt ? (
        <div className="mb-6">
          <Notice still title="This rule has ended">
            {rule.endReason ?? 'It makes nothing due any more.'}
          </Notice>
        </div>
      ) : null}
      <RuleForm key={`${rule.id}:${rule.revision}`} data={data} />
    </>
  );
}
