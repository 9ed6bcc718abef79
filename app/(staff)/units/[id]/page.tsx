import type { Metadata } from 'next';
import { cache } from 'react';
import { FilesSection } from '@/components/files/FilesSection';
import { UnitMeasurements } from '@/components/measurements/UnitMeasurements';
import { UnitActions } from '@/components/units/UnitActions';
import { UnitDuties } from '@/components/units/UnitDuties';
import { UnitFacts } from '@/components/units/UnitFacts';
import { UnitHistory } from '@/components/units/UnitHistory';
import { UnitMeter } from '@/components/units/UnitMeter';
import { UnitStanding } from '@/components/units/UnitStanding';
import { LinkButton } from '@/components/ui/LinkButton';
import { Notice } from '@/components/ui/Notice';
import { PageHeader } from '@/components/ui/PageHeader';
import { listAttachments } from '@/lib/actions/list-attachments';
import { listMeasurements } from '@/lib/actions/list-measurements';
import { openUnit } from '@/lib/actions/open-unit';
import { may as mayAtDock } from '@/lib/auth/may';
import { pageContext } from '@/lib/auth/page';
import { orNotFound, pageId } from '@/lib/auth/page-row';
import { unitPageQuery } from '@/lib/schemas/fleet';

type Props = {
  params: Promise<{ id: string }>;
  searchParams: Promise<Record<string, string | string[] | undefined>>;
};

const load = cache(async (id: string, query: string) =>
  orNotFound(openUnit(await pageContext(), id, unitPageQuery.parse(JSON.parse(query)))),
);

/** Metadata and page ask with the same words, so the unit is read once. */
const loadFrom = async ({ params, searchParams }: Props) =>
  load(await pageId(params), JSON.stringify(await searchParams));

export async function generateMetadata(props: Props): Promise<Metadata> {
  const { unit } = await loadFrom(props);
  return { title: `${unit.fleetNumber} at ${unit.dockName}` };
}

export default async function UnitPage(props: Props) {
  const page = await loadFrom(props);
  const { unit, duties, may } = page;
  const ctx = await pageContext();
  const [measurements, files] = await Promise.all([
    listMeasurements(ctx, unit.id),
    listAttachments(ctx, { unitId: unit.id }),
  ]);
  return (
    <>
      <PageHeader
        kicker={`${unit.modelName} · ${unit.dockName}`}
        title={<span className="numerals">{unit.fleetNumber}</span>}
        actions={<UnitActions page={page} me={ctx.actor.personId} />}
      />
      <div className="grid gap-10">
        <UnitStanding page={page} />
        <UnitMeter page={page} />
        <section className="grid gap-4">
          <div className="flex flex-wrap items-end justify-between gap-3">
            <h2 className="text-2xl">What comes due</h2>
            {may.recordBaseline ? (
              <LinkButton href={`/units/${unit.id}/baselines`}>Last done before it came</LinkButton>
            ) : null}
          </div>
          {duties.assessed || unit.state === null ? null : (
            <Notice still title="Not yet assessed">
              Its due points are being worked out; what is shown may be what held before.
            </Notice>
          )}
          <UnitDuties duties={duties} />
        </section>
        <section className="grid gap-4">
          <h2 className="text-2xl">About the unit</h2>
          <UnitFacts unit={unit} />
        </section>
        <UnitMeasurements measurements={measurements} />
        <FilesSection
          of={{ unitId: unit.id }}
          initial={files.items}
          me={ctx.actor.personId}
          mayAdd={mayAtDock(ctx, 'attachment.write', unit.dockId)}
          mayRemove={mayAtDock(ctx, 'attachment.remove', unit.dockId)}
        />
        <UnitHistory page={page} />
      </div>
    </>
  );
}
