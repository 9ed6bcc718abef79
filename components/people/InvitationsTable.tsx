import { DataTable } from '@/components/ui/DataTable';
import { Tag } from '@/components/ui/Tag';
import { Timestamp } from '@/components/ui/Timestamp';
import type { Invitation } from '@/lib/schemas/invitation';
import { InvitationButtons } from './InvitationButtons';
import { docksInWords, roleWord, type NamedDock } from './words';

/** The invitations that nobody has accepted yet. */
export function InvitationsTable({
  invitations,
  docks,
  now,
}: {
  invitations: Invitation[];
  docks: NamedDock[];
  now: Date;
}) {
  return (
    <DataTable
      caption="Open invitations"
      columns={[
        { id: 'name', header: 'Name' },
        { id: 'role', header: 'Role' },
        { id: 'docks', header: 'Works at' },
        { id: 'until', header: 'Link works until' },
        { id: 'do', header: 'Change' },
      ]}
      empty={<p className="py-4 text-ink-soft">Nobody is invited at present.</p>}
      rows={invitations.map((invitation) => ({
        key: invitation.id,
        cells: {
          name: (
            <>
              <span className="block font-semibold">{invitation.name}</span>
              <span className="break-all text-ink-soft">{invitation.email}</span>
            </>
          ),
          role: roleWord(invitation.role),
          docks: docksInWords(invitation.dockIds, docks),
          until:
            new Date(invitation.expiresAt) > now ? (
              <Timestamp at={invitation.expiresAt} now={now} timeZone="UTC" />
            ) : (
              <Tag tone="warn">Over</Tag>
            ),
          do: <InvitationButtons invitation={invitation} />,
        },
      }))}
    />
  );
}
