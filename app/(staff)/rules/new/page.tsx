import type { Metadata } from 'next';
import { RuleForm } from '@/components/rules/RuleForm';
import { PageHeader } from '@/components/ui/PageHeader';
import { openRuleForm } from '@/lib/actions/open-rule-form';
import { pageContext } from '@/lib/auth/page';
import { orNotFound } from '@/lib/auth/page-row';

export const metadata: Metadata = { title: 'New rule' };

export default async function NewRulePage() {
  const data = await orNotFound(openRuleForm(await pageContext(), null));
  return (
    <>
      <PageHeader kicker="Rules" title="New rule" />
      <RuleForm data={data} />
    </>
  );
}
