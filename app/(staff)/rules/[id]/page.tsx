import type { Metadata } from 'next';
import { EndRule } from '@/components/rules/EndRule';
import { RuleForm } from '@/components/rules/RuleForm';
import { Notice } from '@/components/ui/Notice';
import { PageHeader } from '@/components/ui/PageHeader';
import { openRuleForm } from '@/lib/actions/open-rule-form';
import { pageContext } from '@/lib/auth/page';
import { orNotFound, pageId } from '@/lib/auth/page-row';

export const metadata: Metadata = { title: 'Rule' };

export default async function RulePage({ params }: { params: Promise<{ id: string }> }) {
  const data = await orNotFound(openRuleForm(await pageContext(), await pageId(params)));
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
